const DAY = 86_400_000;
const MINUTE = 60_000;

/**
 * A moment of the invented past: a time of day (UTC), so many days before the first start.
 *
 * @param time - "14:18"
 */
export function momentBefore(firstStart: Date, days: number, time: string): string {
  const day = new Date(firstStart.getTime() - days * DAY).toISOString().slice(0, 10);
  return new Date(`${day}T${time}:00.000Z`).toISOString();
}

/**
 * A moment of the first start's own session, counted back from it, so that it never lies ahead.
 *
 * @param minutes - before the first start
 */
export function minutesBefore(firstStart: Date, minutes: number): string {
  return new Date(firstStart.getTime() - minutes * MINUTE).toISOString();
}
