/** A problem of one's own to change at will: lean θ and range R of a can, read in a series A. */
import type { SignedIn } from './server.ts';

export interface SmallProblem {
  readonly path: string;
  readonly theta: string;
  readonly range: string;
  readonly series: string;
}

export async function makeSmallProblem(person: SignedIn, number = 20): Promise<SmallProblem> {
  const path = `/api/teams/tern-rock/problems/${number}`;
  const made = await person.post('/api/teams/tern-rock/problems', {
    number,
    title: 'Leaning Can',
    statement: 'A can leans.',
    tasks: [],
    owners: [],
  });
  if (made.status !== 201) throw new Error(`makeSmallProblem: answered ${made.status} ${made.text}`);
  const theta = await add(person, `${path}/quantities`, recorded('θ', 'lean of the can', '°'));
  const range = await add(person, `${path}/quantities`, recorded('R', 'range on the tray', 'cm'));
  const series = await add(person, `${path}/series`, {
    name: 'lean',
    held: {},
    settings: [theta],
    readings: [range],
  });
  return { path, theta, range, series };
}

/** Adds a definition and gives its id. */
export async function add(person: SignedIn, address: string, row: object): Promise<string> {
  const answer = await person.post(address, { mutationId: newMutation(), row });
  if (answer.status !== 201) throw new Error(`add: answered ${answer.status} ${answer.text}`);
  return String(answer.body.id);
}

export function recorded(symbol: string, name: string, unit: string) {
  return { symbol, name, unit, status: 'measured', def: { origin: 'recorded', instrument: null } };
}

let mutations = 0;

export function newMutation(): string {
  mutations += 1;
  return `mutation-${process.pid}-${mutations}`;
}
