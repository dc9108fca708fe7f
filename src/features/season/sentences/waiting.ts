import type { Role } from '#shared/contracts/session.ts';
import type { ProblemSummary } from '#shared/contracts/teams.ts';
import { paths } from '#src/lib/paths.ts';
import { countInWords } from '#shared/evidence/words.ts';

/** One thing that waits for a person: `before`, the linked words, `after`. */
export interface Waiting {
  readonly key: string;
  readonly before: string;
  readonly linked: string;
  readonly after: string;
  readonly to: string;
}

interface Reader {
  readonly id: string;
  readonly role: Role;
}

const MOST = 4;

/** What waits for this person in the problems they own, those of the next fight first. */
export function waitingFor(reader: Reader, team: string, problems: readonly ProblemSummary[]): Waiting[] {
  if (reader.role === 'advisor') return [];
  const own = problems.filter(({ owners }) => owners.some(({ id }) => id === reader.id));
  const sorted = own.toSorted((a, b) => Number(b.stage === 'report') - Number(a.stage === 'report'));
  return sorted.flatMap((problem) => thingsIn(team, problem)).slice(0, MOST);
}

function thingsIn(team: string, problem: ProblemSummary): Waiting[] {
  const address = { team, number: problem.number };
  const { title, notTied, claims, trials } = problem;
  const things: Waiting[] = [];
  if (notTied > 0) {
    const linked = notTied === 1 ? 'one number' : `${countInWords(notTied)} numbers`;
    const after = ` in ${title} ${notTied === 1 ? 'is' : 'are'} not tied`;
    things.push({ key: `tie-${problem.number}`, before: '', linked, after, to: paths.report(address) });
  }
  if (claims.leaks > 0) {
    const linked = claims.leaks === 1 ? 'one claim' : `${countInWords(claims.leaks)} claims`;
    const after = ` in ${title} ${claims.leaks === 1 ? 'leaks' : 'leak'}`;
    things.push({ key: `leak-${problem.number}`, before: '', linked, after, to: paths.claims(address) });
  }
  if (trials === 0) {
    const to = paths.station(address, 'trials');
    things.push({
      key: `log-${problem.number}`,
      before: `${title} has `,
      linked: 'no trials',
      after: ' yet',
      to,
    });
  } else if (claims.undecided > 0 && claims.leaks === 0) {
    const linked = claims.undecided === 1 ? 'one claim' : `${countInWords(claims.undecided)} claims`;
    const after = ` in ${title} ${claims.undecided === 1 ? 'is' : 'are'} undecided`;
    things.push({ key: `claim-${problem.number}`, before: '', linked, after, to: paths.claims(address) });
  }
  return things;
}
