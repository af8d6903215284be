/** What a buyer agrees to before she is sent to the pay page, with the version of the words she read. */
export interface OrderTerms {
  readonly wordsVersion: string;
  /** She asked that the parts open at once. */
  readonly startAtOnce: boolean;
  /** She knows that she gives up the time to withdraw by that. */
  readonly withdrawalGivenUp: boolean;
  readonly agreedAt: string;
}
