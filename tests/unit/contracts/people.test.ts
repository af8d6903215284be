import { describe, expect, test } from 'vitest';
import type { z } from 'astro/zod';
import { LetInForm, RestoreForm, SendAgainForm, SuspendForm, TryAgainForm } from '#contracts/office.ts';
import { AccountForm, ChangePasswordForm, ConfirmForm, EndSessionForm, ForgottenForm, isTimeZone, NewPasswordForm, ProveForm, SignInForm, SignUpForm } from '#contracts/people.ts';
import { fieldSentences } from '#server/web/form.ts';

const FORMS: Readonly<Record<string, z.ZodTypeAny>> = { SignInForm, SignUpForm, ForgottenForm, ConfirmForm, NewPasswordForm, ChangePasswordForm, ProveForm, AccountForm, EndSessionForm, LetInForm, SuspendForm, RestoreForm, SendAgainForm, TryAgainForm };
/** How the parsing library speaks when nobody told it what to say. */
const NOT_OURS = /Required|Expected|Invalid|String must|Number must|received/;

const sentences = (schema: z.ZodTypeAny, typed: unknown): string[] => {
  const parsed = schema.safeParse(typed);
  return parsed.success ? [] : Object.values(fieldSentences(parsed.error));
};

describe.each(Object.entries(FORMS))('%s', (_name, schema) => {
  const names = Object.keys((schema as unknown as { shape: object }).shape);
  const filledWith = (value: unknown): Record<string, unknown> => Object.fromEntries(names.map((name) => [name, value]));

  test.each([
    ['nothing', {}],
    ['every field empty', filledWith('')],
    ['every field of blanks', filledWith('   ')],
    ['every field twice', filledWith(['a', 'b'])],
    ['every field a page long', filledWith('x'.repeat(5_000))],
    ['every field of hidden signs', filledWith('\u0000\u202e')],
  ])('sent with %s answers in our own words, or does without', (_what, typed) => {
    for (const sentence of sentences(schema, typed)) expect(sentence).not.toMatch(NOT_OURS);
  });
});

describe('signing up', () => {
  const maud = { name: ' Maud Ellery ', email: ' Maud@Weavers.example', password: '  two kettles  ' };

  test('takes the blanks from name and address, none from the password', () => {
    expect(SignUpForm.parse(maud)).toEqual({ name: 'Maud Ellery', email: { address: 'Maud@weavers.example', key: 'maud@weavers.example' }, password: '  two kettles  ' });
  });

  test('takes nothing that its form has no field for', () => {
    const parsed = SignUpForm.parse({ ...maud, role: 'steward', isSteward: 'true', emailConfirmedAt: '2026-01-01', id: '1' });
    expect(Object.keys(parsed).sort()).toEqual(['email', 'name', 'password']);
  });

  test.each([
    [{ ...maud, email: 'maud@' }, 'email', 'The part after the @ is missing. Write it like name@saltmarsh.example.'],
    [{ ...maud, name: 'Maud\u0007' }, 'name', 'There is a sign in it that cannot be shown. Type it again.'],
    [{ ...maud, name: 'M'.repeat(81) }, 'name', 'At most 80 characters work here.'],
    [{ ...maud, password: '' }, 'password', 'The password is missing.'],
  ])('says what is wrong at its field', (typed, field, says) => {
    const parsed = SignUpForm.safeParse(typed);
    expect(parsed.success ? {} : fieldSentences(parsed.error)).toEqual({ [field]: says });
  });
});

test.each(['UTC', 'Europe/Berlin', 'America/Argentina/Ushuaia', 'Asia/Kolkata'])('%s is a time zone', (zone) => {
  expect(isTimeZone(zone)).toBe(true);
});

test.each(['', 'Mars/Base', '+02:00', '../etc', 'Europe/Berlin\n', 'UTC '])('%j is none', (zone) => {
  expect(isTimeZone(zone)).toBe(false);
});

test.each(['saltmarsh-loom-room', 'a', 'a1-2b'])('%s is a handle', (handle) => {
  expect(sentences(LetInForm, { person: 'x', workroom: 'Saltmarsh', handle })).toEqual([]);
});

test.each(['-a', 'a-', 'a--b', 'Ä', 'Saltmarsh', 'a b', 'a/b', 'a.b', 'a'.repeat(41)])('%s is none, and the sentence says what is', (handle) => {
  expect(sentences(LetInForm, { person: 'x', workroom: 'Saltmarsh', handle })).toHaveLength(1);
});
