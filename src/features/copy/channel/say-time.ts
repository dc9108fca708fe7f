/** "1:45" of 105 seconds. */
export function sayTime(seconds: number): string {
  const rest = seconds % 60;
  return `${Math.floor(seconds / 60)}:${String(rest).padStart(2, '0')}`;
}
