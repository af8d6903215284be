/** How long a part takes, as a teacher told it in minutes: `50 min`, `1 h 40`, `2 h`. */
export function takesWords(minutes: number): string {
  if (minutes < 60) return `${minutes}\u00a0min`;
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  return rest === 0 ? `${hours}\u00a0h` : `${hours}\u00a0h\u00a0${String(rest).padStart(2, '0')}`;
}
