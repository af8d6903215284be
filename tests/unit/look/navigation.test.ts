import { describe, expect, it } from 'vitest';
import { accountNavigation, breastNavigation, mainNavigation, type NavigationFacts } from '#components/site/navigation.ts';

const labels = (facts: NavigationFacts) => mainNavigation(facts).map(({ label }) => label);
const visitor: NavigationFacts = { area: 'public', person: null };
const student: NavigationFacts = { area: 'public', person: { roles: ['student'] } };
const teacher: NavigationFacts = { area: 'public', person: { roles: ['student', 'teacher'] } };
const helper: NavigationFacts = { area: 'workroom', person: { roles: ['helper'] } };
const steward: NavigationFacts = { area: 'public', person: { roles: ['steward'] } };

/** Every page of the house that may be led to. */
const pages = ['/', '/series', '/reckoner', '/handbook', '/sign-in', '/sign-up', '/account', '/loom', '/notices', '/workroom', '/workroom/bench', '/workroom/questions', '/workroom/helpers', '/workroom/students', '/workroom/money', '/office', '/series/low-tide/gather'];

describe('the places in the top beam', () => {
  it('shows a visitor what is open to everybody', () => {
    expect(labels(visitor)).toEqual(['Series', 'Reckoner', 'Handbook']);
  });

  it('begins with her loom for a student', () => {
    expect(labels(student)).toEqual(['My loom', 'Series', 'Reckoner', 'Handbook']);
  });

  it('shows at a student’s loom how much she was told and has not read', () => {
    expect(mainNavigation({ area: 'public', person: { roles: ['student'], unread: 2 } })[0]).toMatchObject({ place: 'loom', count: { of: 2, word: 'unread' } });
    expect(mainNavigation({ area: 'public', person: { roles: ['student'], unread: 0 } })[0]?.count).toBeUndefined();
  });

  it('leads a student inside a series to what it needs, with the number of things not ticked yet', () => {
    const inside = mainNavigation({ ...student, series: { slug: 'low-tide', toGather: 6 } });
    expect(inside.find(({ place }) => place === 'gather')).toMatchObject({ href: '/series/low-tide/gather', count: { of: 6, word: 'to gather' } });
  });

  it('begins with the workroom and the bench for a teacher', () => {
    expect(labels({ ...teacher, waiting: 3 }).slice(0, 2)).toEqual(['Workroom', 'Bench']);
    expect(mainNavigation({ ...teacher, waiting: 3 })[1]?.count).toEqual({ of: 3, word: 'waiting' });
  });

  it('shows no number where nothing waits', () => {
    expect(mainNavigation({ ...teacher, waiting: 0 })[1]?.count).toBeUndefined();
  });

  it('keeps students and money from a helper in the workroom', () => {
    expect(labels(helper)).toEqual(['Today', 'Bench', 'Questions', 'Series']);
    expect(labels({ ...teacher, area: 'workroom' })).toEqual(['Today', 'Bench', 'Questions', 'Series', 'Students', 'Money']);
  });

  it('leads a steward to the office, and nobody else', () => {
    expect(labels(steward)[0]).toBe('Office');
    for (const facts of [visitor, student, teacher]) expect(labels(facts)).not.toContain('Office');
  });
});

describe('the bar at the foot of a phone', () => {
  it('is not there for a visitor', () => {
    expect(breastNavigation(visitor)).toEqual([]);
  });

  it('never has more than five places, and her account where there is room', () => {
    for (const facts of [student, teacher, { ...teacher, area: 'workroom' as const }, helper, steward, { ...student, series: { slug: 'low-tide' } }]) {
      expect(breastNavigation(facts).length).toBeLessThanOrEqual(5);
    }
    expect(breastNavigation(student).at(-1)?.place).toBe('account');
  });

  it('leaves money to the menu of a teacher’s name in the workroom', () => {
    const inside: NavigationFacts = { ...teacher, area: 'workroom' };
    expect(breastNavigation(inside).map(({ label }) => label)).toEqual(['Today', 'Bench', 'Questions', 'Series', 'Students']);
    expect(accountNavigation(inside).map(({ label }) => label)).toContain('Money');
    expect(accountNavigation(helper).map(({ label }) => label)).not.toContain('Money');
  });
});

it('leads only to pages that are there', () => {
  for (const roles of [[], ['student'], ['teacher'], ['helper'], ['steward'], ['student', 'teacher', 'helper', 'steward']] as const) {
    for (const area of ['public', 'workroom', 'office'] as const) {
      const facts: NavigationFacts = { area, person: { roles }, series: { slug: 'low-tide' } };
      for (const { href } of [...mainNavigation(facts), ...breastNavigation(facts), ...accountNavigation(facts)]) {
        expect(pages).toContain(href.split('#')[0]);
      }
    }
  }
});

it('never leads twice to one place', () => {
  for (const roles of [['student'], ['teacher'], ['student', 'teacher', 'helper', 'steward']] as const) {
    const places = mainNavigation({ area: 'public', person: { roles } }).map(({ place }) => place);
    expect(new Set(places).size).toBe(places.length);
  }
});
