/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** Who asks, as the frame of a page needs to know them; null for a visitor. */
    person?: import('#components/site/person.ts').SitePerson | null;
    ctx: import('#server/context.ts').Context;
    /** A sentence left by the page before: what was done. */
    said: string | null;
    /** Why this request was refused, for the page that says so. */
    refusal?: {
      status: number;
      says: string;
      requestId: string;
      /** Where to try the same once more; null when it was a form. */
      again: string | null;
    };
  }
}
