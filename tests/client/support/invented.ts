/** One invented team for client tests, as the API tells it. */
import type { Role, Session } from '#shared/contracts/session.ts';
import type { Problem, ProblemSummary, Team } from '#shared/contracts/teams.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';

export const TODAY = new Date('2026-03-03T10:00:00');

export function session(role: Role = 'captain'): Session {
  return {
    user: { id: 'p-ines', name: 'Ines Farrow', email: 'ines.farrow@skerry.example' },
    teams: [{ slug: 'tern-rock', name: 'Tern Rock', university: 'Skerry University', role }],
  };
}

export function team(changes: Partial<Team> = {}): Team {
  return {
    slug: 'tern-rock',
    name: 'Tern Rock',
    university: 'Skerry University',
    isDemo: true,
    people: [
      { id: 'p-ines', name: 'Ines Farrow', role: 'captain' },
      { id: 'p-kasimir', name: 'Kasimir Lund', role: 'member' },
      { id: 'p-odile', name: 'Odile Marsk', role: 'advisor' },
    ],
    season: { from: '2026-01-01T00:00:00', to: '2026-05-31T00:00:00' },
    fights: [
      { id: 'f1', name: 'Fight 1', at: '2026-02-14T09:30:00', result: '2nd of 3', stages: [] },
      {
        id: 'f2',
        name: 'Fight 2',
        at: '2026-03-14T09:30:00',
        stages: [
          { role: 'oppose', problem: 6 },
          { role: 'report', problem: 1, against: 'Gannet Bank' },
        ],
      },
    ],
    ...changes,
  };
}

export function summary(changes: Partial<ProblemSummary> = {}): ProblemSummary {
  return {
    number: 1,
    title: 'Leaning Spout',
    statement: 'A tall can with a hole in its side is filled and leaned. How far can its jet reach?',
    owners: [{ id: 'p-ines', name: 'Ines Farrow', role: 'captain' }],
    stage: 'report',
    levels: [
      { section: 'Phenomenon', level: 'Held' },
      { section: 'Model', level: 'Tied' },
      { section: 'Experiment', level: 'Held' },
      { section: 'Comparison', level: 'Drafted' },
      { section: 'Conclusion', level: 'Sketched' },
    ],
    claims: { holds: 2, leaks: 1, undecided: 1 },
    trials: 31,
    notTied: 2,
    ...changes,
  };
}

export function problem(changes: Partial<Problem> = {}): Problem {
  return {
    number: 1,
    title: 'Leaning Spout',
    statement: 'How far can its jet reach?',
    tasks: [{ id: 'task-reach', text: 'How far can its jet reach?' }],
    owners: [{ id: 'p-ines', name: 'Ines Farrow', role: 'captain' }],
    settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
    rowVersion: 3,
    ...changes,
  };
}

/** A problem in which nothing has been entered yet. */
export function emptyEvidence(changes: Partial<Evidence> = {}): Evidence {
  return {
    version: 1,
    settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
    instruments: [],
    quantities: [],
    series: [],
    trials: [],
    models: [],
    comparisons: [],
    claims: [],
    charts: [],
    ...changes,
  };
}
