/** Freezes an edition of problem 1 and lends it, as its captain does. */
import type { Copy } from '#shared/contracts/copies.ts';
import { FIRST_START, SPOUT, type SignedIn } from './server.ts';

export interface Lent {
  readonly copy: Copy;
  readonly token: string;
  /** "/api/copies/…". */
  readonly path: string;
}

export const HOUR = 3_600_000;

/** So many hours from the first start. */
export function hours(count: number): string {
  return new Date(FIRST_START.getTime() + count * HOUR).toISOString();
}

const WANTED = {
  recipient: 'Gannet Bank',
  reader: 'opponent',
  from: hours(-1),
  until: hours(48),
  passphrase: null as string | null,
  mayPrint: true,
};

export async function lend(
  captain: SignedIn,
  wanted: Partial<typeof WANTED> = {},
  problem = SPOUT,
): Promise<Lent> {
  const n = await freeze(captain, problem);
  const answer = await captain.post(`${problem}/editions/${n}/copies`, { ...WANTED, ...wanted });
  if (answer.status !== 201) throw new Error(`lend: answered ${answer.status} ${answer.text}`);
  const { copy, token } = answer.body as { copy: Copy; token: string };
  return { copy, token, path: `/api/copies/${token}` };
}

/** The number of a new edition. */
export async function freeze(captain: SignedIn, problem = SPOUT): Promise<number> {
  const before = (await captain.get(`${problem}/editions`)).body as { n: number }[];
  const after = before[0]?.n ?? 0;
  const answer = await captain.post(`${problem}/editions`, { note: '', after });
  if (answer.status !== 201) throw new Error(`freeze: answered ${answer.status} ${answer.text}`);
  return after + 1;
}
