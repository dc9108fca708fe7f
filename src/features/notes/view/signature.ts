import { timeOrDay } from '#src/lib/dates/say-date.ts';
import { firstName, lastName } from '#src/lib/say/last-name.ts';

/** "O. Marsk, 14:20": how notes and answers are signed. */
export function signature(name: string, at: string, now: Date): string {
  return `${firstName(name).slice(0, 1)}. ${lastName(name)}, ${timeOrDay(new Date(at), now)}`;
}
