/** A place in a video as its player shows it: `6:40`, `1:02:05`. */
export function clockTime(ms: number): string {
  const seconds = Math.floor(ms / 1000);
  const hours = Math.floor(seconds / 3600);
  const minutes = Math.floor(seconds / 60) % 60;
  const two = (value: number): string => String(value).padStart(2, '0');
  return hours > 0 ? `${String(hours)}:${two(minutes)}:${two(seconds % 60)}` : `${String(minutes)}:${two(seconds % 60)}`;
}
