import { createHash, randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { editionFigures } from '#shared/editions/edition-figures.ts';
import type { FrozenEdition } from '#shared/editions/frozen-edition.ts';
import { sealOf } from '#shared/editions/seal.ts';
import type { Edition } from '#shared/contracts/editions.ts';
import type { Database } from '#server/database/database.ts';
import type { PrintedEdition } from './edition-pdf.ts';
import { toEdition } from './model.ts';

/** An edition about to be written. */
export interface NewEdition {
  readonly problemId: string;
  readonly n: number;
  readonly by: { readonly id: string; readonly name: string };
  readonly note: string;
  readonly content: FrozenEdition;
  /** See sealContent. */
  readonly seal: string;
  /** null: it is printed when it is first asked for. */
  readonly pdf: PrintedEdition | null;
}

export function sealContent(content: FrozenEdition): string {
  return sealOf(content, sha256);
}

export function sha256(data: string | Uint8Array): string {
  return createHash('sha256').update(data).digest('hex');
}

/** Writes an edition whole, in one row. */
export async function storeEdition(
  database: Database,
  { problemId, n, by, note, content, seal, pdf }: NewEdition,
  transaction: Transaction,
): Promise<Edition> {
  const row = await database.models.editions.create(
    {
      id: randomUUID(),
      problemId,
      n,
      frozenAt: content.at,
      frozenBy: by.name,
      userId: by.id,
      note,
      seal,
      schemaVersion: content.schemaVersion,
      ...editionFigures(content),
      content: JSON.stringify(content),
      pages: pdf?.pages ?? null,
      pdfSha: pdf === null ? null : sha256(pdf.bytes),
      pdf: pdf === null ? null : Buffer.from(pdf.bytes),
    },
    { transaction },
  );
  return toEdition(row);
}
