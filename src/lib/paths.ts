import type { ProblemAddress } from './problem/problem-address.ts';

/** A problem's stations in their order; the digit keys follow it. */
export const STATIONS = ['trials', 'model', 'report', 'leaks', 'editions'] as const;
export type Station = (typeof STATIONS)[number];

function problem({ team, number }: ProblemAddress): string {
  return `/team/${encodeURIComponent(team)}/problem/${number}`;
}

/** Links are built here and nowhere else. */
export const paths = {
  signIn: (to?: string) => (to === undefined ? '/' : `/?to=${encodeURIComponent(to)}`),
  forgotten: () => '/forgotten',
  account: () => '/account',
  admin: () => '/admin',
  season: (team: string) => `/team/${encodeURIComponent(team)}`,
  fights: (team: string) => `/team/${encodeURIComponent(team)}/fights`,
  copies: (team: string) => `/team/${encodeURIComponent(team)}/copies`,
  people: (team: string) => `/team/${encodeURIComponent(team)}/people`,
  newProblem: (team: string) => `/team/${encodeURIComponent(team)}/new-problem`,
  /** Goes on to the station last used. */
  problem,
  station: (at: ProblemAddress, station: Station) => `${problem(at)}/${station}`,
  /** `hash` is a trial's name: B12. */
  trials: (at: ProblemAddress, series?: string, hash?: string) =>
    `${problem(at)}/trials${series ? `/${encodeURIComponent(series)}` : ''}${hash ? `#${hash}` : ''}`,
  model: (at: ProblemAddress, n?: number) => `${problem(at)}/model${n === undefined ? '' : `/${n}`}`,
  claims: (at: ProblemAddress, n?: number) =>
    `${problem(at)}/model/claims${n === undefined ? '' : `#claim-${n}`}`,
  /** `hash` is a section's number or an anchor in the document. */
  report: (at: ProblemAddress, hash?: string | number) =>
    `${problem(at)}/report${hash === undefined ? '' : `#${hash}`}`,
  /** Laid beside the draft, or beside another edition. */
  edition: (at: ProblemAddress, n: number, beside?: number) =>
    `${problem(at)}/editions/${n}${beside === undefined ? '' : `?beside=${beside}`}`,
  /** What the reader of one of our copies sees. */
  copyPreview: (at: ProblemAddress, copy: string) => `${problem(at)}/copies/${encodeURIComponent(copy)}`,
  /** A lent copy, for whoever holds its token. */
  copy: (token: string) => `/copy/${encodeURIComponent(token)}`,
  settings: (at: ProblemAddress) => `${problem(at)}/settings`,
};
