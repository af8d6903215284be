// Which places the head of a page and the breast bar offer, to whom, and in which order.
import type { GlyphName } from '#islands/ui/glyphs.ts';
import type { SitePerson } from '#components/site/person.ts';

/** The part of the house a page belongs to. */
export type Area = 'public' | 'workroom' | 'office';

export type Place =
  | 'loom' | 'gather' | 'series' | 'reckoner' | 'handbook' | 'notices' | 'account'
  | 'workroom' | 'bench' | 'questions' | 'workroom-series' | 'students' | 'money' | 'helpers'
  | 'office' | 'sign-in';

export interface NavLink {
  place: Place;
  href: string;
  label: string;
  glyph: GlyphName;
  /** A number of things that wait there, with the word that is read after it. */
  count?: { of: number; word: string };
}

export interface NavigationFacts {
  area: Area;
  person: Pick<SitePerson, 'roles' | 'unread'> | null;
  /** The series a student is in, where the page belongs to one. */
  series?: { slug: string; toGather?: number };
  /** Photos waiting on the bench. */
  waiting?: number;
  /** Questions waiting in the inbox. */
  asked?: number;
}

const link = (place: Place, href: string, label: string, glyph: GlyphName): NavLink => ({ place, href, label, glyph });

const series = link('series', '/series', 'Series', 'series');
const reckoner = link('reckoner', '/reckoner', 'Reckoner', 'reckoner');
const handbook = link('handbook', '/handbook', 'Handbook', 'book');
const loom = link('loom', '/loom', 'My loom', 'loom');
const workroom = link('workroom', '/workroom', 'Workroom', 'today');
const office = link('office', '/office', 'Office', 'office');
const notices = link('notices', '/notices', 'Notices', 'post');
const account = link('account', '/account', 'Account', 'person');
const breastLength = 5;

const counted = (place: NavLink, of: number | undefined, word: string): NavLink => (of === undefined || of === 0 ? place : { ...place, count: { of, word } });

const bench = (waiting: number | undefined): NavLink => counted(link('bench', '/workroom/bench', 'Bench', 'bench'), waiting, 'waiting');

const helpers = link('helpers', '/workroom/helpers', 'Helpers', 'people');
const money = link('money', '/workroom/money', 'Money', 'coin');

function insideWorkroom({ person, waiting, asked }: NavigationFacts): NavLink[] {
  const today = { ...workroom, label: 'Today' };
  const both = [today, bench(waiting), counted(link('questions', '/workroom/questions', 'Questions', 'ask'), asked, 'waiting')];
  const own = link('workroom-series', '/workroom#series', 'Series', 'series');
  if (!person?.roles.includes('teacher')) return [...both, own];
  return [...both, own, link('students', '/workroom/students', 'Students', 'people'), money];
}

function outside({ person, series: current, waiting }: NavigationFacts): NavLink[] {
  const roles = person?.roles ?? [];
  const desk: NavLink[] = [];
  if (roles.includes('steward')) desk.push(office);
  if (roles.includes('teacher') || roles.includes('helper')) desk.push(workroom, bench(waiting));
  if (person === null) return [series, reckoner, handbook];
  const gather = current === undefined ? [] : [counted(link('gather', `/series/${current.slug}/gather`, 'Gather', 'gather'), current.toGather, 'to gather')];
  const own = desk.length > 0 && current === undefined ? [] : [counted(loom, person.unread, 'unread')];
  return [...desk, ...own, ...gather, series, ...(gather.length > 0 && desk.length > 0 ? [] : [reckoner]), handbook];
}

/** The links of the top beam, in order. */
export function mainNavigation(facts: NavigationFacts): NavLink[] {
  if (facts.area === 'workroom') return insideWorkroom(facts);
  if (facts.area === 'office') return [office, series, handbook];
  return outside(facts);
}

/** The links of the bar at the foot of a phone: at most five. A visitor has none. */
export function breastNavigation(facts: NavigationFacts): NavLink[] {
  if (facts.person === null) return [];
  const main = mainNavigation(facts);
  if (main.length >= breastLength) return main.slice(0, breastLength);
  return [...main, account];
}

/** What the menu under a person's name holds, beside signing out. */
export function accountNavigation({ area, person }: NavigationFacts): NavLink[] {
  const roles = person?.roles ?? [];
  const places: NavLink[] = [loom, counted(notices, person?.unread, 'unread')];
  if (roles.includes('teacher') || roles.includes('helper')) places.push(workroom);
  if (roles.includes('steward')) places.push(office);
  if (area === 'workroom') places.push(helpers);
  // The bar at the foot of a phone has no room for it.
  if (area === 'workroom' && roles.includes('teacher')) places.push(money);
  if (area !== 'public') places.push(series);
  return [...places, account];
}
