/** What is said of copies, and to whom and until when one is lent unless the captain says otherwise. */
import { describe, expect, test } from 'vitest';
import type { Copy } from '#shared/contracts/copies.ts';
import type { Fight } from '#shared/contracts/teams.ts';
import { dayScale } from '#src/features/copies/components/day-scale.tsx';
import { borrowedSentence, outSentence, readerWords } from '#src/features/copies/sentences/copy-words.ts';
import { lendDefaults } from '#src/features/copies/sentences/lend-defaults.ts';
import { sayTime } from '#src/features/copy/channel/say-time.ts';
import { readWords } from '#src/features/copy/passages/use-read-shares.ts';

const NOW = new Date('2026-03-03T12:00:00');

function copy(changes: Partial<Copy> = {}): Copy {
  return {
    id: 'c-1',
    number: 1,
    problem: { number: 1, title: 'Leaning Spout' },
    edition: { n: 2, seal: 'b7e241c09d3a', at: '2026-02-28T18:00:00.000Z' },
    reader: 'opponent',
    recipient: 'Gannet Bank',
    from: '2026-03-02T12:00:00.000Z',
    until: '2026-03-14T20:00:00.000Z',
    standing: 'open',
    takenBackAt: null,
    hasPassphrase: false,
    mayPrint: false,
    lentAt: '2026-03-02T12:00:00.000Z',
    lentBy: 'Ines Farrow',
    views: { opened: 0, printed: 0, firstAt: null, lastAt: null },
    ...changes,
  };
}

const OPENED = {
  opened: 2,
  printed: 1,
  firstAt: '2026-03-02T13:00:00',
  lastAt: '2026-03-03T09:05:00',
} as const;

describe('what is out', () => {
  test('none, one and several: are said in a sentence with how many were opened', () => {
    expect(outSentence([])).toBe('No copy of ours is out.');
    expect(outSentence([copy()])).toBe('One copy of ours is out, none has been opened yet.');
    expect(outSentence([copy({ views: OPENED })])).toBe('One copy of ours is out, and has been opened.');
    expect(outSentence([copy(), copy({ views: OPENED }), copy({ standing: 'taken back' })])).toBe(
      'Two copies of ours are out, one has been opened.',
    );
  });

  test('a reader: is told with how often and when it was last opened, and whether it was printed', () => {
    expect(readerWords(copy({ views: OPENED }))).toBe(
      'opponent, opened two times, printed, last 3 Mar, 09:05',
    );
    expect(readerWords(copy())).toBe('opponent, not opened yet');
    expect(readerWords(copy({ standing: 'ended' }))).toBe('opponent, never opened');
  });

  test('what is lent to us: names each team once', () => {
    const { problem, edition, reader, from, until, takenBackAt } = copy();
    const borrowed = { id: 'b', team: 'Long Skerry', problem, edition, reader, from, until, takenBackAt };

    expect(
      borrowedSentence([
        { ...borrowed, standing: 'open' },
        { ...borrowed, standing: 'open' },
      ]),
    ).toBe('Long Skerry lends us Leaning Spout.');
    expect(borrowedSentence([{ ...borrowed, standing: 'ended' }])).toBeNull();
  });
});

describe('lending', () => {
  const fight: Fight = {
    id: 'f',
    name: 'Fight 2',
    at: '2026-03-14T09:30:00',
    stages: [{ role: 'report', problem: 1, against: 'Gannet Bank' }],
  };

  test('a problem that is reported next: goes to its opponent, until the evening of that fight', () => {
    const { recipient, until, fight: name } = lendDefaults([fight], 1, NOW);

    expect([recipient, name]).toEqual(['Gannet Bank', 'Fight 2']);
    expect([until.getDate(), until.getHours()]).toEqual([14, 20]);
  });

  test('without a fight to come: a week, and nobody in particular', () => {
    const { recipient, until, fight: name } = lendDefaults([], 1, NOW);

    expect([recipient, name]).toEqual(['', null]);
    expect(until.getTime() - NOW.getTime()).toBe(7 * 86_400_000);
  });

  test('the scale of days: holds every copy, today and the fights that are near', () => {
    const far = { ...fight, id: 'far', at: '2026-09-01T09:00:00' };
    const scale = dayScale([copy()], [fight, far], NOW);

    expect(scale.fights).toEqual([fight]);
    expect(scale.from).toBeLessThan(Date.parse(copy().from));
    expect(scale.to).toBeGreaterThan(Date.parse(copy().until));
  });
});

test.each([
  [0, '0:00'],
  [45, '0:45'],
  [105, '1:45'],
])('%i seconds are said as %s', (seconds, said) => {
  expect(sayTime(seconds)).toBe(said);
});

test.each([
  [0, 'not read'],
  [0.2, 'begun'],
  [0.5, 'half read'],
  [0.9, 'nearly read'],
  [1, 'read'],
])('a section of which %d was read is "%s"', (share, words) => {
  expect(readWords(share)).toBe(words);
});
