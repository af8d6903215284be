/** Forms of having an account. The sentences are what a person reads at the field. */
import { z } from 'astro/zod';
import { filled, ticked } from '#contracts/fields.ts';
import { parseMailAddress } from '#core/mail-address.ts';

const MISSING_ADDRESS = 'The mail address is missing. Write it like name@saltmarsh.example.';

export const mailAddress = filled(MISSING_ADDRESS, 320).transform((typed, check) => {
  const outcome = parseMailAddress(typed);
  if (outcome.ok) return outcome.value;
  check.addIssue({ code: z.ZodIssueCode.custom, message: outcome.problems[0]?.message ?? MISSING_ADDRESS });
  return z.NEVER;
});

/** Not trimmed: blanks belong to a password. What is too long to be one is refused before it is hashed. */
const password = (missing = 'The password is missing.') =>
  z.string({ required_error: missing, invalid_type_error: missing }).min(1, missing).max(1_024, 'At most 256 characters work.');

const name = filled('Your name is missing. It stands beside your photos and questions.', 80)
  .refine((text) => !/\p{C}/u.test(text), 'There is a sign in it that cannot be shown. Type it again.');

const token = z.string().max(100).catch('');

/** Where to go afterwards; judged again where it is used. */
const to = z.string().max(2_000).optional().catch(undefined);

export const SignInForm = z.object({ email: mailAddress, password: password(), stay: ticked, to });
export type SignInInput = z.output<typeof SignInForm>;

/** As her browser tells it, where it does; anything else leaves her at the house's own until she chooses. */
const browserZone = z.string().max(64).refine(isTimeZone).optional().catch(undefined);

export const SignUpForm = z.object({ name, email: mailAddress, password: password(), timeZone: browserZone, to });
export type SignUpInput = z.output<typeof SignUpForm>;

export const ForgottenForm = z.object({ email: mailAddress });
export type ForgottenInput = z.output<typeof ForgottenForm>;

export const ConfirmForm = z.object({ token });

export const NewPasswordForm = z.object({ token, password: password() });
export type NewPasswordInput = z.output<typeof NewPasswordForm>;

export const ChangePasswordForm = z.object({ oldPassword: password('Your old password is missing.'), password: password('The new password is missing.') });
export type ChangePasswordInput = z.output<typeof ChangePasswordForm>;

export const ProveForm = z.object({ password: password(), to });
export type ProveInput = z.output<typeof ProveForm>;

const UNITS = ['cm', 'in'] as const;
const SCHEMES = ['system', 'light', 'dark'] as const;

export const timeZone = z.string({ required_error: 'The time zone is missing.', invalid_type_error: 'The time zone is missing.' }).max(64, 'There is no such time zone.').refine(isTimeZone, 'There is no such time zone. Choose one of the list.');

export const AccountForm = z.object({
  name,
  units: z.enum(UNITS, { errorMap: () => ({ message: 'Choose cm or inches.' }) }),
  scheme: z.enum(SCHEMES, { errorMap: () => ({ message: 'Choose the light of the device, day or evening.' }) }),
  timeZone,
});
export type AccountInput = z.output<typeof AccountForm>;

export const EndSessionForm = z.object({ session: z.string().max(64).catch('') });
export const NothingForm = z.object({});

/** Whether `name` is a zone of the IANA database that this runtime knows. */
export function isTimeZone(zone: string): boolean {
  try {
    return /^[A-Za-z]/.test(zone) && new Intl.DateTimeFormat('en', { timeZone: zone }) instanceof Intl.DateTimeFormat;
  } catch {
    return false;
  }
}
