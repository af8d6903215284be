/** How the office says what the tables hold in short. */

/** `send-letter-again` → `Send letter again` */
export function inWords(name: string): string {
  const words = name.replaceAll('-', ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** Seconds as a person would say them: `40 s`, `12 min`, `3 h`, `2 days`. */
export function lateWords(seconds: number): string {
  if (seconds < 60) return `${seconds} s`;
  if (seconds < 3_600) return `${Math.floor(seconds / 60)} min`;
  if (seconds < 172_800) return `${Math.floor(seconds / 3_600)} h`;
  return `${Math.floor(seconds / 86_400)} days`;
}

/** The details of a log entry in one line. */
export function detailWords(detail: Readonly<Record<string, unknown>>): string {
  return Object.entries(detail).map(([name, value]) => `${name}: ${typeof value === 'string' ? value : JSON.stringify(value)}`).join(', ');
}
