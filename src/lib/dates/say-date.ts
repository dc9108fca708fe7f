const DAY_MS = 86_400_000;

/** "14 March" */
export function dayAndMonth(date: Date): string {
  return date.toLocaleDateString('en-GB', { day: 'numeric', month: 'long' });
}

/** "14 Feb" */
export function dayAndShortMonth(date: Date): string {
  // The locale writes "Sept", and months of three letters keep columns narrow.
  return `${date.getDate()} ${date.toLocaleDateString('en-GB', { month: 'long' }).slice(0, 3)}`;
}

/** "Saturday 14 March" */
export function weekdayDayAndMonth(date: Date): string {
  return `${date.toLocaleDateString('en-GB', { weekday: 'long' })} ${dayAndMonth(date)}`;
}

/** "09:30" */
export function timeOfDay(date: Date): string {
  return date.toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });
}

/** "14:18" on the day itself, "26 Feb" on any other. */
export function timeOrDay(date: Date, now: Date): string {
  return daysBetween(now, date) === 0 ? timeOfDay(date) : dayAndShortMonth(date);
}

/** Whole days of the calendar from one moment to another; 0 on the same day, negative in the past. */
export function daysBetween(from: Date, to: Date): number {
  const dayOf = (date: Date) => Date.UTC(date.getFullYear(), date.getMonth(), date.getDate());
  return Math.round((dayOf(to) - dayOf(from)) / DAY_MS);
}

/** "today", "tomorrow", "in 11 days". */
export function inDays(days: number): string {
  if (days === 0) return 'today';
  return days === 1 ? 'tomorrow' : `in ${days} days`;
}
