/** What a teacher earned, from the rows of the ledger: each currency for itself, nothing rounded, nothing added across. */
export type LedgerKind = 'sale' | 'fee' | 'refund' | 'fee-refund';

export interface LedgerSum {
  readonly kind: LedgerKind;
  readonly currency: string;
  readonly count: number;
  /** As in the ledger: sales and fees given back above 0, refunds and fees below. */
  readonly amountMinor: number;
}

export interface CurrencySum {
  readonly currency: string;
  readonly seats: number;
  readonly refunds: number;
  readonly salesMinor: number;
  /** 0 or below. */
  readonly refundsMinor: number;
  readonly takenInMinor: number;
  /** What the house keeps, less what it gave back: 0 or below. */
  readonly feeMinor: number;
  readonly yoursMinor: number;
}

/** One sum for each currency, the one with most seats first. */
export function sumUp(rows: readonly LedgerSum[]): readonly CurrencySum[] {
  const currencies = [...new Set(rows.map(({ currency }) => currency))];
  const sums = currencies.map((currency): CurrencySum => {
    const of = (kind: LedgerKind): { count: number; minor: number } =>
      rows.filter((row) => row.currency === currency && row.kind === kind).reduce((sum, row) => ({ count: sum.count + row.count, minor: sum.minor + row.amountMinor }), { count: 0, minor: 0 });
    const [sales, refunds, fees, feesBack] = [of('sale'), of('refund'), of('fee'), of('fee-refund')];
    const takenInMinor = sales.minor + refunds.minor;
    const feeMinor = fees.minor + feesBack.minor;
    return { currency, seats: sales.count, refunds: refunds.count, salesMinor: sales.minor, refundsMinor: refunds.minor, takenInMinor, feeMinor, yoursMinor: takenInMinor + feeMinor };
  });
  return sums.toSorted((a, b) => b.seats - a.seats);
}
