/**
 * Whether a YAML text may nest so deep that reading it takes all memory: half a megabyte of opening brackets ends the process
 * of the parser we use. Judged by signs alone, whatever they stand in, so words that only look like nesting count too;
 * the list of a whole series has a few hundred brackets at most, and never so many marks in a row.
 */
const MOST_BRACKETS = 1_000;
const MANY_MARKS_IN_A_ROW = /(?:[-?:&!*]\S{0,100}\s+){50}/;

export function nestsTooDeep(yaml: string): boolean {
  let brackets = 0;
  for (const sign of yaml) {
    if (sign === '[' || sign === '{') brackets += 1;
    if (brackets > MOST_BRACKETS) return true;
  }
  return MANY_MARKS_IN_A_ROW.test(yaml);
}
