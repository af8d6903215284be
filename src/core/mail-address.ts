/**
 * Which mail addresses this house writes to. The rule is narrower than RFC 5322 on purpose: an address goes into the
 * envelope of a mail (RFC 5321 §4.1.2), where a comma, an angle bracket or a line break would name somebody else.
 */
import { fail, succeed, type Outcome } from './outcome.ts';

export interface MailAddress {
  /** What goes into the envelope: the part before the @ as typed, the domain in lower case and ASCII (punycode). */
  readonly address: string;
  /** The same for every way of writing it: what decides whether two people have one address. */
  readonly key: string;
}

/** RFC 5321 §4.5.3.1: octets before the @, and of the domain. */
const LONGEST_LOCAL = 64;
const LONGEST_DOMAIN = 255;

/** `atext` of RFC 5322 §3.2.3, in dot-atom form; quoted local parts are not written to. */
const LOCAL = /^[A-Za-z0-9!#$%&'*+/=?^_`{|}~-]+(?:\.[A-Za-z0-9!#$%&'*+/=?^_`{|}~-]+)*$/;
const TYPED_LABEL = /^[\p{L}\p{N}](?:[\p{L}\p{M}\p{N}-]*[\p{L}\p{M}\p{N}])?$/u;
const ASCII_DOMAIN = /^(?:[a-z0-9](?:[a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z](?:[a-z0-9-]{0,61}[a-z0-9])$/;
const FORBIDDEN = /[\s,:;<>"'()[\]\\\p{C}]/u;

const LIKE = 'Write it like name@saltmarsh.example.';

/** Reads an address as a person typed it; spaces around it are dropped. */
export function parseMailAddress(text: string): Outcome<MailAddress> {
  const typed = text.trim();
  if (typed === '') return refuse('E_ADDRESS_MISSING', `The mail address is missing. ${LIKE}`);
  const [local = '', domain, ...more] = typed.split('@');
  if (more.length > 0) return refuse('E_ADDRESS_MANY', `One address, with one @ in it. ${LIKE}`);
  if (domain === undefined) return refuse('E_ADDRESS_NO_AT', `The @ is missing. ${LIKE}`);
  if (local === '') return refuse('E_ADDRESS_NO_NAME', `The part before the @ is missing. ${LIKE}`);
  if (domain === '') return refuse('E_ADDRESS_NO_DOMAIN', `The part after the @ is missing. ${LIKE}`);
  const strange = FORBIDDEN.exec(local.replaceAll("'", '')) ?? FORBIDDEN.exec(domain);
  if (strange) return refuse('E_ADDRESS_SIGN', `${nameOfSign(strange[0])} cannot stand in a mail address. ${LIKE}`);
  if (local.length > LONGEST_LOCAL || domain.length > LONGEST_DOMAIN) return refuse('E_ADDRESS_LONG', `This is longer than a mail address can be. ${LIKE}`);
  if (!LOCAL.test(local)) return refuse('E_ADDRESS_NAME', `The part before the @ does not work. ${LIKE}`);
  const ascii = asciiDomain(domain);
  if (ascii === undefined) return refuse('E_ADDRESS_DOMAIN', `The part after the @ does not work. ${LIKE}`);
  const address = `${local}@${ascii}`;
  return succeed({ address, key: address.toLowerCase() });
}

/** Whether `address` may go into an envelope exactly as it stands. */
export function isEnvelopeAddress(address: string): boolean {
  const outcome = parseMailAddress(address);
  return outcome.ok && outcome.value.address === address;
}

/** The domain in lower case, with letters outside ASCII as punycode (RFC 5891), or nothing when it is no domain. */
function asciiDomain(domain: string): string | undefined {
  if (!domain.split('.').every((label) => TYPED_LABEL.test(label))) return undefined;
  const url = URL.canParse(`http://${domain}`) ? new URL(`http://${domain}`) : undefined;
  const ascii = url?.hostname.toLowerCase();
  return ascii !== undefined && ascii.length <= LONGEST_DOMAIN && ASCII_DOMAIN.test(ascii) ? ascii : undefined;
}

function nameOfSign(sign: string): string {
  if (/\s/.test(sign)) return 'A space';
  return /\p{C}/u.test(sign) ? 'A hidden sign' : `The sign ${sign}`;
}

function refuse(code: string, message: string): Outcome<MailAddress> {
  return fail([{ code, path: '', message }]);
}
