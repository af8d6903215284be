/** Whether a person may have the password she wants; the rules are core's, the list of common ones is ours. */
import { judgePassword } from '#core/password-rules.ts';
import { isCommonPassword } from '#server/auth/common-passwords.ts';
import { fieldError } from '#server/errors.ts';

/** @throws VALIDATION at `password` with a sentence that says what would work. */
export function mustBeGoodPassword(password: string, person: { readonly name: string; readonly email: string; readonly isSteward: boolean }): void {
  const verdict = judgePassword(password, { isSteward: person.isSteward, ownWords: [person.name, person.email], isCommon: isCommonPassword });
  if (!verdict.ok) throw fieldError('password', verdict.says);
}
