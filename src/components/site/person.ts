export type { Role, SitePerson } from '#contracts/site-person.ts';
