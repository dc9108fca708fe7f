import type { BorrowedCopy, Copy } from '#shared/contracts/copies.ts';
import { dayAndMonth, dayAndShortMonth, timeOfDay } from '#src/lib/dates/say-date.ts';
import { sayList } from '#src/lib/say/say-list.ts';
import { countInWords } from '#shared/evidence/words.ts';

/** "opponent, opened 1 March", "reviewer, not opened yet". */
export function readerWords(copy: Copy): string {
  const { reader, views } = copy;
  if (views.firstAt === null) return `${reader}, ${isOut(copy) ? 'not opened yet' : 'never opened'}`;
  const times = views.opened === 1 ? 'once' : `${countInWords(views.opened)} times`;
  const last = new Date(views.lastAt ?? views.firstAt);
  const printed = views.printed > 0 ? ', printed' : '';
  return `${reader}, opened ${times}${printed}, last ${dayAndShortMonth(last)}, ${timeOfDay(last)}`;
}

/** "open until 15 March, 18:00", "taken back 15 February". */
export function closesWords(copy: Pick<Copy, 'standing' | 'from' | 'until' | 'takenBackAt'>): string {
  const until = new Date(copy.until);
  switch (copy.standing) {
    case 'waiting':
      return `opens ${dayAndMonth(new Date(copy.from))}, closes ${dayAndMonth(until)}, ${timeOfDay(until)}`;
    case 'open':
      return `${dayAndMonth(until)}, ${timeOfDay(until)}`;
    case 'ended':
      return `closed ${dayAndMonth(until)}`;
    case 'taken back':
      return `taken back ${dayAndMonth(new Date(copy.takenBackAt ?? copy.until))}`;
  }
}

/** Whether it can still be read, now or later. */
export function isOut({ standing }: Pick<Copy, 'standing'>): boolean {
  return standing === 'open' || standing === 'waiting';
}

/** "Three copies of ours are out, two have been opened." */
export function outSentence(lent: readonly Copy[]): string {
  const out = lent.filter(isOut);
  if (out.length === 0) return 'No copy of ours is out.';
  const opened = out.filter(({ views }) => views.opened > 0).length;
  const count = capital(countInWords(out.length));
  const first = out.length === 1 ? 'One copy of ours is out' : `${count} copies of ours are out`;
  if (opened === 0) return `${first}, none has been opened yet.`;
  if (opened === out.length) return `${first}, ${out.length === 1 ? 'and has' : 'all have'} been opened.`;
  return `${first}, ${countInWords(opened)} ${opened === 1 ? 'has' : 'have'} been opened.`;
}

/** "Long Skerry lends us Braked Magnet."; null: nobody lends us anything. */
export function borrowedSentence(borrowed: readonly BorrowedCopy[]): string | null {
  const open = borrowed.filter(isOut);
  if (open.length === 0) return null;
  const teams = [...new Set(open.map(({ team }) => team))];
  return teams
    .map((team) => {
      const titles = [
        ...new Set(open.filter((copy) => copy.team === team).map(({ problem }) => problem.title)),
      ];
      return `${team} lends us ${sayList(titles)}.`;
    })
    .join(' ');
}

/** "3 out". */
export function outCount(lent: readonly Copy[]): string {
  const count = lent.filter(isOut).length;
  return `${count === 0 ? 'none' : count} out`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
