/** Copies of editions, from the side of their readers. */
import type { OpenCopy } from '#shared/contracts/copies.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import { fitsPassphrase } from '#server/features/account/service.ts';
import { findPicture } from '#server/features/files/service.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { PdfFile } from '#server/rendering/pdf-file.ts';
import { getOpenCopy, getUnpassedCopy, type CopyVisitor, type ReadingDeps } from './find-copy.ts';
import { printCopy } from './print-copy.ts';
import type { CopyModel } from './model.ts';
import { hashSecretToken } from '#server/tokens/secret-token.ts';
import { standingAt } from './standing.ts';
import { recordView } from './record-view.ts';
import { viewOf } from './copy-views.ts';

/** Opens a copy. That it was opened is logged, unless the team that lent it looks itself. */
export async function openCopy(deps: ReadingDeps, visitor: CopyVisitor): Promise<OpenCopy> {
  const { row, isLender } = await getOpenCopy(deps, visitor);
  const open = await toOpenCopy(deps, row, !isLender);
  if (!isLender) await recordView(deps, row, 'opened');
  return open;
}

/** What the reader of a copy gets, for the captain who lent it. */
export async function previewCopy(deps: ReadingDeps, place: ProblemPlace, id: string): Promise<OpenCopy> {
  const row = await deps.database.models.copies.findOne({
    where: { id, problemId: place.problem.id },
    raw: true,
  });
  if (!row) throw notFound('There is no such copy of this problem.');
  return toOpenCopy(deps, row, false);
}

async function toOpenCopy(deps: ReadingDeps, row: CopyModel, mayAsk: boolean): Promise<OpenCopy> {
  return {
    number: row.number,
    recipient: row.recipient,
    reader: row.reader,
    until: row.closesAt,
    mayPrint: Boolean(row.mayPrint),
    mayAsk,
    view: await viewOf(deps.database, row),
  };
}

/** Gives a pass for the right passphrase; 422 `wrong-passphrase`. */
export async function passCopy(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  passphrase: string,
): Promise<string | null> {
  const { row } = await getUnpassedCopy(deps, visitor);
  if (row.passphraseHash === null) return null;
  if (await fitsPassphrase(row.passphraseHash, passphrase)) return deps.copyPasses.issue('opening', row.id);
  const sentence = 'This is not the passphrase of this copy. Ask the team that lent it.';
  throw new AppError(422, 'wrong-passphrase', sentence, { fields: { passphrase: sentence } });
}

/** Until when a copy is open, while it is. */
export async function getStanding(deps: ReadingDeps, visitor: CopyVisitor): Promise<{ until: string }> {
  const { row } = await getOpenCopy(deps, visitor);
  return { until: row.closesAt };
}

/** A picture of the lent report, and of no other. */
export async function getCopyPicture(
  deps: ReadingDeps,
  visitor: CopyVisitor,
  sha: string,
): Promise<Uint8Array> {
  const { row } = await getOpenCopy(deps, visitor);
  const { files } = await viewOf(deps.database, row);
  const bytes = files.includes(sha) ? await findPicture(deps, row.problemId, sha) : null;
  if (!bytes) throw notFound('The report has no such picture.');
  return bytes;
}

/** The report for paper, marked for its recipient; 403 `not-for-print`. */
export async function getCopyPdf(deps: ReadingDeps, visitor: CopyVisitor): Promise<PdfFile> {
  const { row, isLender } = await getOpenCopy(deps, visitor);
  if (!row.mayPrint) {
    throw new AppError(403, 'not-for-print', 'This copy was lent for reading on screen, not for print.');
  }
  const file = await printCopy(deps, row);
  if (!isLender) await recordView(deps, row, 'printed');
  return file;
}

/** The copy of the invented demonstration that anybody may try, while it is open; null otherwise. */
export async function findDemoCopy(
  { database, now }: Pick<ReadingDeps, 'database' | 'now'>,
  token: string,
): Promise<{ token: string; recipient: string; title: string } | null> {
  const row = await database.models.copies.findOne({
    where: { tokenHash: hashSecretToken(token) },
    raw: true,
  });
  if (!row || standingAt(row, now()) !== 'open') return null;
  const problem = await database.models.problems.findByPk(row.problemId, {
    attributes: ['title'],
    raw: true,
  });
  return problem ? { token, recipient: row.recipient, title: problem.title } : null;
}
