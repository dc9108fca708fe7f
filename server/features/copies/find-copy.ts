import type { CopyStanding } from '#shared/contracts/copies.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { ServerDeps } from '#server/deps.ts';
import { listTeamIds } from '#server/features/teams/service.ts';
import type { PassKind } from './copy-passes.ts';
import type { CopyModel } from './model.ts';
import { standingAt } from './standing.ts';
import { hashSecretToken } from '#server/tokens/secret-token.ts';

export type ReadingDeps = Pick<
  ServerDeps,
  'database' | 'environment' | 'events' | 'now' | 'renderer' | 'copyPasses'
>;

/** Who stands before a copy: what they hold, and who they are, if they are signed in. */
export interface CopyVisitor {
  readonly token: string;
  readonly userId: string | null;
  /** Passes of their browser, for this copy. */
  readonly passes: Readonly<Partial<Record<PassKind, string>>>;
}

/** A copy as it is found by its token. */
export interface FoundCopy {
  readonly row: CopyModel;
  readonly standing: CopyStanding;
  /** Whether the visitor is signed in as somebody of the team that lent it. */
  readonly isLender: boolean;
}

/** The one refusal of every token that opens nothing: unknown, forged, too early, too late, taken back. */
export function noCopy(): AppError {
  return notFound('No copy is open at this address. Its time may be over, or it was taken back.');
}

/** The copy of a token, however it stands with it; null when there is none. */
export async function findCopy(
  { database, now }: ReadingDeps,
  { token, userId }: CopyVisitor,
): Promise<FoundCopy | null> {
  const row = await database.models.copies.findOne({
    where: { tokenHash: hashSecretToken(token) },
    raw: true,
  });
  if (!row) return null;
  const teams = userId === null ? [] : await listTeamIds(database, userId);
  return { row, standing: standingAt(row, now()), isLender: teams.includes(row.teamId) };
}

/** The copy of a token while it is open; the one 404 otherwise, and 403 `passphrase-needed` until it was shown. */
export async function getOpenCopy(deps: ReadingDeps, visitor: CopyVisitor): Promise<FoundCopy> {
  const found = await getUnpassedCopy(deps, visitor);
  const { id, passphraseHash } = found.row;
  if (passphraseHash !== null && !deps.copyPasses.isValid('opening', id, visitor.passes.opening)) {
    throw new AppError(403, 'passphrase-needed', 'This copy asks for the passphrase that was given with it.');
  }
  return found;
}

/** The same, before its passphrase was shown. */
export async function getUnpassedCopy(deps: ReadingDeps, visitor: CopyVisitor): Promise<FoundCopy> {
  const found = await findCopy(deps, visitor);
  if (found?.standing !== 'open') throw noCopy();
  return found;
}
