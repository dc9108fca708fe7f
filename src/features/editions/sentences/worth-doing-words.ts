import type { WorthDoing } from '#shared/editions/worth-doing.ts';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { sayList } from '#src/lib/say/say-list.ts';
import { countInWords } from '#shared/evidence/words.ts';

/** One thing worth doing: the linked words, and what follows them. */
export interface Worth {
  readonly key: string;
  readonly linked: string;
  readonly after: string;
  readonly to: string;
}

/** What is worth doing before freezing, as parts of one sentence; each leads to where it is done. */
export function worthDoingWords(address: ProblemAddress, worth: WorthDoing): Worth[] {
  const tie = worth.notTied.map(({ section, count }) => ({
    key: `tie-${section}`,
    linked: `tie ${countInWords(count)} ${count === 1 ? 'number' : 'numbers'}`,
    after: ` in section ${section}`,
    to: paths.report(address, section),
  }));
  const write = worth.blank.slice(0, 1).map((section) => ({
    key: 'write',
    linked: 'write',
    after: ` ${worth.blank.length === 1 ? 'section' : 'sections'} ${sayList(worth.blank.map(String))}`,
    to: paths.report(address, section),
  }));
  return [
    ...tie,
    ...write,
    ...claims(
      'look',
      `at ${claimWords(worth.leaking)}, which ${verb(worth.leaking, 'leaks', 'leak')}`,
      worth.leaking,
    ),
    ...claims('decide', claimWords(worth.undecided), worth.undecided),
  ];

  function claims(linked: string, after: string, numbers: readonly number[]): Worth[] {
    const [first] = numbers;
    return first === undefined
      ? []
      : [{ key: linked, linked, after: ` ${after}`, to: paths.claims(address, first) }];
  }
}

function claimWords(numbers: readonly number[]): string {
  return `${numbers.length === 1 ? 'claim' : 'claims'} ${sayList(numbers.map(String))}`;
}

function verb(numbers: readonly number[], one: string, many: string): string {
  return numbers.length === 1 ? one : many;
}
