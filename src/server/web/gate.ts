/** The route rules applied to one person. */
import type { Actor } from '#server/context.ts';
import type { RouteRule } from '#server/web/route-rules.ts';

export type GateAnswer = 'in' | 'sign-in-first' | 'not-yours' | 'nothing-here';

/** An unknown route (`rule` undefined) is closed to everybody. */
export function gate(rule: RouteRule | undefined, actor: Actor | null): GateAnswer {
  if (rule === undefined) return 'nothing-here';
  if (rule === 'public' || rule === 'machine') return 'in';
  if (actor === null) return 'sign-in-first';
  switch (rule) {
    case 'signed-in':
      return 'in';
    case 'teacher':
      return actor.workroomId === null ? 'not-yours' : 'in';
    case 'bench':
      return actor.workroomId === null && actor.helpsInWorkroomIds.length === 0 ? 'not-yours' : 'in';
    case 'steward':
      return actor.isSteward ? 'in' : 'nothing-here';
  }
}

/** A path to come back to: only within this site, so that a link cannot send a person elsewhere after signing in. */
export function safeReturn(to: string | null | undefined, otherwise: string): string {
  return to !== null && to !== undefined && /^\/(?![/\\])[\x21-\x7e]*$/.test(to) && !to.includes('\\') ? to : otherwise;
}
