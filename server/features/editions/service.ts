/** Editions: the draft frozen with its findings, sealed, printed once, and never changed. The captain freezes. */
import type { Edition } from '#shared/contracts/editions.ts';
import { frozenEditionSchema, type FrozenEdition } from '#shared/editions/frozen-edition.ts';
import { AppError } from '#server/errors/app-error.ts';
import { invalid, notFound } from '#server/errors/refusals.ts';
import type { Database } from '#server/database/database.ts';
import type { ServerDeps } from '#server/deps.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { pdfFileName, type PdfFile } from '#server/rendering/pdf-file.ts';
import { printEdition, type PrintedEdition } from './edition-pdf.ts';
import { freezeContent } from './freeze-content.ts';
import { LISTED, toEdition, type EditionModel } from './model.ts';
import { sealContent, sha256, storeEdition } from './store-edition.ts';

export { sealContent, storeEdition } from './store-edition.ts';

/** An edition with its content, and the id that other tables know it by. */
export interface KeptEdition {
  readonly id: string;
  readonly edition: Edition;
  readonly content: FrozenEdition;
}

/** A problem's editions, the newest first. */
export async function listEditions(database: Database, problemId: string): Promise<Edition[]> {
  const rows = await database.models.editions.findAll({
    attributes: [...LISTED],
    where: { problemId },
    order: [['n', 'DESC']],
    raw: true,
  });
  return rows.map(toEdition);
}

/** The newest edition without its content; null when nothing has been frozen yet. */
export async function findLatestEdition(
  database: Database,
  problemId: string,
): Promise<{ readonly id: string; readonly edition: Edition } | null> {
  const row = await database.models.editions.findOne({
    attributes: [...LISTED],
    where: { problemId },
    order: [['n', 'DESC']],
    raw: true,
  });
  return row ? { id: row.id, edition: toEdition(row) } : null;
}

/** One edition with all it keeps; 404 when there is none of that number. */
export async function getEdition(database: Database, problemId: string, n: number): Promise<KeptEdition> {
  const row = await database.models.editions.findOne({
    attributes: [...LISTED, 'content'],
    where: { problemId, n },
    raw: true,
  });
  if (!row) throw notFound(`There is no edition ${n} of this problem.`);
  return toKept(row);
}

function toKept(row: EditionModel): KeptEdition {
  return {
    id: row.id,
    edition: toEdition(row),
    content: frozenEditionSchema.parse(JSON.parse(row.content)),
  };
}

/**
 * Freezes the draft as the next edition: content, seal and PDF in one write. 409 `frozen-meanwhile` when somebody else
 * froze since the captain looked.
 */
export async function freezeEdition(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  { note, after }: { readonly note: string; readonly after: number },
): Promise<Edition> {
  await assertNewest(deps.database, place.problem.id, after);
  const content = await freezeContent(deps, place);
  const n = after + 1;
  const seal = sealContent(content);
  const pdf = await tryToPrint(deps, place.problem.id, { n, seal, content });
  const edition = await deps.database.write(async (transaction) => {
    await assertNewest(deps.database, place.problem.id, after);
    const stored = await storeEdition(
      deps.database,
      { problemId: place.problem.id, n, by: actor, note, content, seal, pdf },
      transaction,
    );
    await deps.database.models.auditEvents.create(
      {
        teamId: place.team.id,
        problemId: place.problem.id,
        version: null,
        mutationId: null,
        userId: actor.id,
        at: content.at,
        action: `freeze edition ${n}`,
        before: '[]',
        changes: JSON.stringify([{ table: 'editions', n, seal }]),
      },
      { transaction },
    );
    return stored;
  });
  deps.events.publishStale(place, 'editions', place.problem.number);
  return edition;
}

/** Freezing does not hang on printing: what cannot be printed now is printed when it is first asked for. */
async function tryToPrint(
  deps: ServerDeps,
  problemId: string,
  edition: { readonly n: number; readonly seal: string; readonly content: FrozenEdition },
): Promise<PrintedEdition | null> {
  try {
    return await printEdition(deps, problemId, edition);
  } catch (error) {
    deps.logger.error({ err: error, edition: edition.n }, 'an edition was frozen without its PDF');
    return null;
  }
}

async function assertNewest(database: Database, problemId: string, after: number): Promise<void> {
  const latest = await findLatestEdition(database, problemId);
  const newest = latest?.edition.n ?? 0;
  if (newest < after) throw invalid({ after: `There is no edition ${after} yet.` });
  if (!latest || newest === after) return;
  throw new AppError(
    409,
    'frozen-meanwhile',
    `${latest.edition.by} froze edition ${newest} while you were here. Look at it first, then freeze edition ${newest + 1} if there is more to keep.`,
  );
}

/** The PDF of an edition. The first bytes ever served are kept, with their hash, and served from then on. */
export async function getEditionPdf(deps: ServerDeps, place: ProblemPlace, n: number): Promise<PdfFile> {
  const problemId = place.problem.id;
  const row = await deps.database.models.editions.findOne({
    attributes: [...LISTED, 'content', 'pdf'],
    where: { problemId, n },
    raw: true,
  });
  if (!row) throw notFound(`There is no edition ${n} of this problem.`);
  const { content } = toKept(row);
  const bytes = row.pdf ?? (await printAndKeep(deps, place, { id: row.id, n, seal: row.seal, content }));
  return { name: pdfFileName(content.problem.title, `edition-${n}`), bytes };
}

async function printAndKeep(
  deps: ServerDeps,
  place: ProblemPlace,
  edition: {
    readonly id: string;
    readonly n: number;
    readonly seal: string;
    readonly content: FrozenEdition;
  },
): Promise<Uint8Array> {
  const printed = await printEdition(deps, place.problem.id, edition);
  const { editions } = deps.database.models;
  const kept = await deps.database.write(async (transaction) => {
    await editions.update(
      { pdf: Buffer.from(printed.bytes), pdfSha: sha256(printed.bytes), pages: printed.pages },
      { where: { id: edition.id, pdf: null }, transaction },
    );
    return editions.findByPk(edition.id, { attributes: ['pdf'], raw: true, transaction });
  });
  deps.events.publishStale(place, 'editions', place.problem.number);
  return kept?.pdf ?? printed.bytes;
}
