import type { Stale } from '#shared/contracts/evidence-changes.ts';
import type { ProblemAddress } from './problem/problem-address.ts';

/** One place for the keys of server data, so that an event can name what has become old. */
export const queryKeys = {
  session: ['session'] as const,
  health: ['health'] as const,
  /** What the link of a mail, or of the first start, opens. */
  link: (kind: 'invitation' | 'setup', token: string) => ['link', kind, token] as const,
  /** Of who looks after the installation; without a name, all of it. */
  admin: (what?: 'teams' | 'people') =>
    what === undefined ? (['admin'] as const) : (['admin', what] as const),
  team: (team: string) => ['team', team] as const,
  problems: (team: string) => ['team', team, 'problems'] as const,
  problem: ({ team, number }: ProblemAddress) => ['team', team, 'problem', number] as const,
  evidence: ({ team, number }: ProblemAddress) => ['team', team, 'problem', number, 'evidence'] as const,
  report: ({ team, number }: ProblemAddress) => ['team', team, 'problem', number, 'report'] as const,
  /** Everything else that is asked for about a team, by the name that a `stale` event gives it. */
  ofTeam: (team: string, what: Stale) => ['team', team, what] as const,
  ofProblem: ({ team, number }: ProblemAddress, what: Stale) =>
    ['team', team, 'problem', number, what] as const,
};
