/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** Who asks, as the frame of a page needs to know them; null for a visitor. */
    person?: import('#components/site/person.ts').SitePerson | null;
  }
}
