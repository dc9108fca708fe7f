import type { Fight } from '#shared/contracts/teams.ts';

export type StageRole = Fight['stages'][number]['role'];

/** Stages are told in words: "we report". */
export const STAGE_WORDS: Readonly<Record<StageRole, string>> = {
  report: 'we report',
  oppose: 'we oppose',
  review: 'we review',
};

const ORDER: readonly StageRole[] = ['report', 'oppose', 'review'];

export interface StageTold {
  readonly role: StageRole;
  readonly title: string;
  readonly against: string | null;
}

/** What we do in a fight, what we report first. */
export function tellStages(fight: Fight, titleOf: (problem: number) => string): StageTold[] {
  return fight.stages
    .map(({ role, problem, against }) => ({ role, title: titleOf(problem), against: against ?? null }))
    .toSorted((a, b) => ORDER.indexOf(a.role) - ORDER.indexOf(b.role));
}
