/** Days and times in words, on the clock of the person who reads them. Zones are IANA names. */

const format = (timeZone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat => new Intl.DateTimeFormat('en-GB', { timeZone, ...options });

/** `9 September 2026` */
export function dayWords(moment: Date, timeZone: string): string {
  return format(timeZone, { day: 'numeric', month: 'long', year: 'numeric' }).format(moment);
}

/** `14:02` */
export function clockWords(moment: Date, timeZone: string): string {
  return format(timeZone, { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' }).format(moment);
}

/** `9 September 2026, 14:02` */
export function momentWords(moment: Date, timeZone: string): string {
  return `${dayWords(moment, timeZone)}, ${clockWords(moment, timeZone)}`;
}
