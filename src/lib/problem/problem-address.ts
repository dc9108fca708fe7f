/** A problem's place: the team's slug and the problem's number. */
export interface ProblemAddress {
  readonly team: string;
  readonly number: number;
}

export function sameProblem(a: ProblemAddress, b: ProblemAddress): boolean {
  return a.team === b.team && a.number === b.number;
}
