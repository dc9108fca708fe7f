const HOUR_MS = 3_600_000;

/** How long each link opens something, in hours. */
export const LINK_HOURS = { reset: 1, setup: 24, invitation: 14 * 24 } as const;

export function expiryOf(link: keyof typeof LINK_HOURS, now: Date): string {
  return new Date(now.getTime() + LINK_HOURS[link] * HOUR_MS).toISOString();
}

/**
 * A moment as mail says it, by the clock of the whole world: the server does not know the reader's.
 * @example sayUtc('2026-03-17T12:05:00.000Z') // => '17 March 2026, 12:05'
 */
export function sayUtc(moment: string): string {
  const options = { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' } as const;
  const day = new Intl.DateTimeFormat('en-GB', options).format(new Date(moment));
  return `${day}, ${moment.slice(11, 16)}`;
}
