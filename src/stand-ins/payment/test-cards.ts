/**
 * The numbers the service documents for trials. Each stands for one thing a bank may do; no number here belongs to anybody,
 * and no other number is taken.
 */
export type CardOutcome =
  | { readonly kind: 'approved'; readonly refunds?: 'later' | 'fail-later' }
  | { readonly kind: 'declined'; readonly code: string; readonly declineCode: string | null; readonly message: string };

export interface TestCard {
  readonly number: string;
  readonly brand: string;
  readonly what: string;
  /** The bank asks its customer first. */
  readonly challenge: boolean;
  readonly outcome: CardOutcome;
}

const APPROVED: CardOutcome = { kind: 'approved' };

function declined(declineCode: string, message = 'Your card was declined.', code = 'card_declined'): CardOutcome {
  return { kind: 'declined', code, declineCode: code === 'card_declined' ? declineCode : null, message };
}

const GENERIC_DECLINE = declined('generic_decline');
const NO_FUNDS = declined('insufficient_funds', 'Your card has insufficient funds.');

/** How many of the list, from its beginning, most trials need. */
export const OFTEN_USED = 5;

export const TEST_CARDS: readonly TestCard[] = [
  { number: '4242424242424242', brand: 'visa', what: 'is taken', challenge: false, outcome: APPROVED },
  { number: '4000002500003155', brand: 'visa', what: 'the bank asks first, then it is taken', challenge: true, outcome: APPROVED },
  { number: '4000000000000002', brand: 'visa', what: 'the bank says no', challenge: false, outcome: GENERIC_DECLINE },
  { number: '4000000000009995', brand: 'visa', what: 'not enough money', challenge: false, outcome: NO_FUNDS },
  { number: '4000000000000069', brand: 'visa', what: 'has expired', challenge: false, outcome: declined('expired_card', 'Your card has expired.', 'expired_card') },
  { number: '5555555555554444', brand: 'mastercard', what: 'is taken', challenge: false, outcome: APPROVED },
  { number: '378282246310005', brand: 'amex', what: 'is taken (four digits on the front)', challenge: false, outcome: APPROVED },
  { number: '4000002760003184', brand: 'visa', what: 'the bank asks every time, then it is taken', challenge: true, outcome: APPROVED },
  { number: '4000000000003220', brand: 'visa', what: 'the bank must be asked, then it is taken', challenge: true, outcome: APPROVED },
  { number: '4000008260003178', brand: 'visa', what: 'the bank asks first, then there is not enough money', challenge: true, outcome: NO_FUNDS },
  { number: '4000008400001629', brand: 'visa', what: 'the bank asks first, then says no', challenge: true, outcome: GENERIC_DECLINE },
  { number: '4000000000009987', brand: 'visa', what: 'reported as lost', challenge: false, outcome: declined('lost_card') },
  { number: '4000000000009979', brand: 'visa', what: 'reported as stolen', challenge: false, outcome: declined('stolen_card') },
  {
    number: '4000000000000127',
    brand: 'visa',
    what: 'the security code is wrong',
    challenge: false,
    outcome: declined('incorrect_cvc', "Your card's security code is incorrect.", 'incorrect_cvc'),
  },
  {
    number: '4000000000000119',
    brand: 'visa',
    what: 'the bank cannot be reached',
    challenge: false,
    outcome: declined('processing_error', 'An error occurred while processing your card. Try again in a little bit.', 'processing_error'),
  },
  { number: '4100000000000019', brand: 'visa', what: 'is stopped as a fraud', challenge: false, outcome: declined('fraudulent') },
  { number: '4000000000007726', brand: 'visa', what: 'is taken; a refund arrives late', challenge: false, outcome: { kind: 'approved', refunds: 'later' } },
  { number: '4000000000005126', brand: 'visa', what: 'is taken; a refund fails later', challenge: false, outcome: { kind: 'approved', refunds: 'fail-later' } },
];

/** Account numbers for the slow way of paying. */
export const TEST_ACCOUNTS = [
  { number: 'DE89370400440532013000', what: 'the money comes after a while', paid: true },
  { number: 'DE62370400440532013001', what: 'the bank says no after a while', paid: false },
] as const;

export function digitsOf(number: string): string {
  return number.replace(/[\s-]/g, '');
}

/** The check digit every card number carries (ISO/IEC 7812-1, Luhn's formula). */
export function hasCheckDigit(digits: string): boolean {
  let sum = 0;
  for (const [place, sign] of [...digits].reverse().entries()) {
    const doubled = Number(sign) * (place % 2 === 0 ? 1 : 2);
    sum += doubled > 9 ? doubled - 9 : doubled;
  }
  return sum % 10 === 0;
}

export function brandOf(digits: string): string {
  if (digits.startsWith('4')) return 'visa';
  if (/^(5[1-5]|2[2-7])/.test(digits)) return 'mastercard';
  return /^3[47]/.test(digits) ? 'amex' : 'unknown';
}

/** A number nobody documented is turned down as the service's test side turns down a real card. */
export function cardFor(digits: string): TestCard {
  return (
    TEST_CARDS.find((card) => card.number === digits) ?? {
      number: digits,
      brand: brandOf(digits),
      what: '',
      challenge: false,
      outcome: declined('test_mode_live_card', 'Your card was declined. Your request was in test mode, but used a non test card.'),
    }
  );
}
