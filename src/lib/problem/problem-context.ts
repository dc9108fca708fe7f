import { createContext, useContext } from 'react';
import type { Role } from '#shared/contracts/session.ts';
import type { Fight, Problem, Team } from '#shared/contracts/teams.ts';
import type { FindingsStore } from '#src/lib/findings/findings-store.ts';
import type { ProblemAddress } from './problem-address.ts';

/** What every screen of a problem may count on; the problem's frame loads it before it shows a screen. */
export interface OpenProblem {
  readonly address: ProblemAddress;
  readonly team: Team;
  readonly problem: Problem;
  readonly role: Role;
  /** Captains and members write; advisors read. The server decides again. */
  readonly mayWrite: boolean;
  /** The name of who is signed in, as trials and models carry it. */
  readonly me: string;
  readonly nextFight: Fight | null;
  /** Evidence and findings of one version, outside React: for node views. */
  readonly store: FindingsStore;
  /** Set where an edition is read that never changes; its cards lead nowhere else. */
  readonly frozen?: {
    /** When it was frozen. */
    readonly at: Date;
    readonly addressOfPicture: (sha: string) => string;
  };
}

export const ProblemContext = createContext<OpenProblem | null>(null);

export function useProblem(): OpenProblem {
  const open = useContext(ProblemContext);
  if (!open) throw new Error('useProblem: needs to stand inside the frame of a problem');
  return open;
}
