/**
 * Passwords that many people use, known without asking anybody: the file beside this one holds six bytes of the SHA-256
 * of each. A chance hit among them is a matter of one in twenty thousand million.
 */
import { createHash } from 'node:crypto';
import file from './common-passwords.json' with { type: 'json' };

const HASH_BYTES = 6;
let kept: ReadonlySet<string> | undefined;

function read(): ReadonlySet<string> {
  const bytes = Buffer.from(file.hashes, 'base64');
  return new Set(Array.from({ length: bytes.length / HASH_BYTES }, (_, at) => bytes.toString('hex', at * HASH_BYTES, (at + 1) * HASH_BYTES)));
}

/** Whether `text` (lower case, NFKC) is a common password or the body of many. */
export function isCommonPassword(text: string): boolean {
  kept ??= read();
  return kept.has(createHash('sha256').update(text).digest('hex').slice(0, HASH_BYTES * 2));
}
