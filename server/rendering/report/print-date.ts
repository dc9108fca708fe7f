const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** The day of a moment as written on paper: "3 March 2026", the same in every time zone. */
export function printDate(at: Date): string {
  return `${at.getUTCDate()} ${MONTHS[at.getUTCMonth()] ?? ''} ${at.getUTCFullYear()}`;
}
