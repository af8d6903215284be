/**
 * Who may come in at each route: the second lock, in front of the policies. A route that is not in this table is
 * closed to everybody, and a test fails; so a new page begins with a line here.
 */
export type RouteRule =
  /** Everybody. What is shown is decided by policies. */
  | 'public'
  /** Machines: with a signature or a token of their own, or asking only what everybody may know. No session, no origin check. */
  | 'machine'
  | 'signed-in'
  /** The owner of a workroom. */
  | 'teacher'
  /** The owner of a workroom or one of her helpers. */
  | 'bench'
  | 'steward';

export const ROUTE_RULES: Readonly<Record<string, RouteRule>> = {
  '/handbook': 'public',
  '/handbook/[...slug]': 'public',
  '/': 'public',
  '/series': 'public',
  '/series/[slug]': 'public',
  '/series/[slug]/seat': 'signed-in',
  '/teachers/[handle]': 'public',
  '/api/seats/[slug]': 'signed-in',
  '/refused': 'public',
  '/404': 'public',
  '/500': 'public',
  '/_components': 'public',
  '/api/payments/events': 'machine',
  '/api/photos': 'signed-in',
  '/api/openapi.json': 'machine',
  '/api/reckon': 'machine',
  '/api/ticks': 'signed-in',
  '/api/video-place': 'signed-in',
  '/api/videos/[...upload]': 'teacher',
  '/api/workroom/lesson-draft': 'teacher',
  '/api/workroom/piece-draft': 'teacher',
  '/api/workroom/pictures': 'teacher',
  '/api/workroom/captions': 'teacher',
  '/api/workroom/series-folder/[slug]': 'teacher',
  '/api/workroom/videos/[video]': 'teacher',
  '/media/[id]/[file]': 'public',
  '/series/[slug]/[part]': 'public',
  '/series/[slug]/[part]/loomside': 'public',
  '/series/[slug]/calendar.ics': 'signed-in',
  '/series/[slug]/timetable': 'signed-in',
  '/calendar/[key].ics': 'machine',
  '/series/[slug]/gather': 'public',
  '/series/[slug]/piece': 'signed-in',
  '/loom': 'signed-in',
  '/notices': 'signed-in',
  '/reckoner': 'public',
  '/sign-in': 'public',
  '/sign-up': 'public',
  '/sign-out': 'public',
  '/forgotten': 'public',
  '/confirm/[token]': 'public',
  '/new-password/[token]': 'public',
  '/account': 'signed-in',
  '/prove': 'signed-in',
  '/office': 'steward',
  '/office/people': 'steward',
  '/office/people/[person]': 'steward',
  '/office/mail': 'steward',
  '/office/jobs': 'steward',
  '/office/log': 'steward',
  '/office/reports': 'steward',
  '/_actions/[...path]': 'public',
  '/_image': 'public',
  '/_server-islands/[name]': 'public',
  '/workroom/money': 'teacher',
  '/workroom/students': 'teacher',
  '/workroom': 'bench',
  '/workroom/bench': 'bench',
  '/workroom/bench/settings': 'bench',
  '/workroom/questions': 'bench',
  '/workroom/series/new': 'teacher',
  '/workroom/series/bring-in': 'teacher',
  '/workroom/series/[slug]': 'teacher',
  '/workroom/series/[slug]/before': 'teacher',
  '/workroom/things': 'teacher',
  '/workroom/series/[slug]/lists': 'teacher',
  '/workroom/series/[slug]/timetable': 'teacher',
  '/workroom/series/[slug]/piece': 'teacher',
  '/workroom/series/[slug]/folder': 'teacher',
  '/workroom/series/[slug]/parts/[part]': 'teacher',
  '/workroom/series/[slug]/parts/[part]/gather': 'teacher',
  '/workroom/series/[slug]/parts/[part]/preview': 'teacher',
  '/workroom/series/[slug]/parts/[part]/settings': 'teacher',
  '/workroom/series/[slug]/parts/[part]/versions': 'teacher',
  '/workroom/series/[slug]/parts/[part]/video': 'teacher',
  '/workroom/series/[slug]/videos/[name]': 'teacher',
};
