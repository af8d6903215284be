/** Whom a notice means, in words. */
export function audienceWords({ series, part, stillDays }: { readonly series: string; readonly part: { readonly number: number; readonly title: string } | null; readonly stillDays: number | null }): string {
  const still = stillDays === null ? '' : `without a step for ${stillDays === 1 ? 'a day' : `${stillDays} days`}`;
  if (part === null) return still === '' ? `Everybody in ${series}` : `Those in ${series} ${still}`;
  return `Those at Part ${part.number} of ${series}, ${part.title}${still === '' ? '' : `, ${still}`}`;
}
