import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Actor } from '#server/context.ts';
import { gate, safeReturn, type GateAnswer } from '#server/web/gate.ts';
import type { RouteRule } from '#server/web/route-rules.ts';

const student: Actor = {
  userId: 1, publicId: 'p', name: 'Maud', email: 'maud@weavers.example', addressConfirmed: true, addressRefused: false, isSteward: false, workroomId: null, workroomName: null, helpsInWorkroomIds: [],
  units: 'cm', timeZone: 'UTC', scheme: 'system', unreadNotices: 0, sessionId: 's', provedAt: new Date(0),
};
const PEOPLE = {
  visitor: null,
  student,
  helper: { ...student, helpsInWorkroomIds: [7] },
  teacher: { ...student, workroomId: 7 },
  steward: { ...student, isSteward: true },
} as const;

type Person = keyof typeof PEOPLE;
const [IN, DOOR, NOT_YOURS, NOTHING]: [GateAnswer, GateAnswer, GateAnswer, GateAnswer] = ['in', 'sign-in-first', 'not-yours', 'nothing-here'];

const TRUTH: [RouteRule | undefined, Record<Person, GateAnswer>][] = [
  ['public', { visitor: IN, student: IN, helper: IN, teacher: IN, steward: IN }],
  ['machine', { visitor: IN, student: IN, helper: IN, teacher: IN, steward: IN }],
  ['signed-in', { visitor: DOOR, student: IN, helper: IN, teacher: IN, steward: IN }],
  ['bench', { visitor: DOOR, student: NOT_YOURS, helper: IN, teacher: IN, steward: NOT_YOURS }],
  ['teacher', { visitor: DOOR, student: NOT_YOURS, helper: NOT_YOURS, teacher: IN, steward: NOT_YOURS }],
  ['steward', { visitor: DOOR, student: NOTHING, helper: NOTHING, teacher: NOTHING, steward: IN }],
  [undefined, { visitor: NOTHING, student: NOTHING, helper: NOTHING, teacher: NOTHING, steward: NOTHING }],
];

describe('the gate', () => {
  for (const [rule, answers] of TRUTH) {
    test.each(Object.entries(answers))(`of a route that is ${rule ?? 'in no table'} answers a %s`, (who, answer) => {
      expect(gate(rule, PEOPLE[who as Person])).toBe(answer);
    });
  }
});

describe('the way back after signing in', () => {
  test.each(['/', '/loom', '/series/low-tide/3', '/series?craft=frame-loom&page=2', '/a?b=c#d', '/account#browsers'])('%s stays as it is', (path) => {
    expect(safeReturn(path, '/otherwise')).toBe(path);
  });

  test.each([
    '', '//elsewhere.example', '/\\elsewhere.example', '\\/elsewhere.example', '/\\/elsewhere.example', 'https://elsewhere.example', 'javascript:alert(1)', 'loom', ' /loom', '/loom\n', '/a b',
    '/\tb', '/x\\y', '/\u202ea', 'http:/loom', '///x', '/loom\r\nSet-Cookie: a=b',
  ])('%j leads to the page it would have led to without', (path) => {
    expect(safeReturn(path, '/otherwise')).toBe('/otherwise');
  });

  test('never leads away from this site, whatever is asked for', () => {
    const hostile = fc.string({ unit: fc.constantFrom(...'/\\.:@?#%&a0\t\n \u0000é') });
    fc.assert(fc.property(hostile, (path) => new URL(safeReturn(path, '/'), 'https://fellmark.example').origin === 'https://fellmark.example'), { numRuns: 3_000 });
  });

  test('is the usual one when none is asked for', () => {
    expect([safeReturn(null, '/loom'), safeReturn(undefined, '/loom')]).toEqual(['/loom', '/loom']);
  });
});
