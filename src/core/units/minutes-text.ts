/** How long a part takes, as its teacher says it: `50 min`, `1 h 40`, `2 h`. */
const NO_BREAK = '\u00a0';

export function minutesText(minutes: number): string {
  if (minutes < 60) return `${minutes}${NO_BREAK}min`;
  const rest = minutes % 60;
  return `${Math.floor(minutes / 60)}${NO_BREAK}h${rest === 0 ? '' : `${NO_BREAK}${String(rest).padStart(2, '0')}`}`;
}
