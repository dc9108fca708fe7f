import { buildCopyView } from '#shared/editions/build-copy-view.ts';
import type { CopyView } from '#shared/editions/copy-view.ts';
import type { Database } from '#server/database/database.ts';
import { getEdition } from '#server/features/editions/service.ts';
import type { CopyModel } from './model.ts';

/** An edition never changes, so what a reader may see of it is worked out once; the oldest go first. */
const MOST_HELD = 12;

const heldBy = new WeakMap<Database, Map<string, Promise<CopyView>>>();

/** The view of the edition that a copy is of. */
export function viewOf(
  database: Database,
  { editionId, problemId }: Pick<CopyModel, 'editionId' | 'problemId'>,
): Promise<CopyView> {
  let held = heldBy.get(database);
  if (!held) heldBy.set(database, (held = new Map()));
  const known = held.get(editionId);
  if (known) return known;
  const view = makeView(database, problemId, editionId);
  held.set(editionId, view);
  view.catch(() => held.delete(editionId));
  for (const oldest of held.keys()) {
    if (held.size <= MOST_HELD) break;
    held.delete(oldest);
  }
  return view;
}

async function makeView(database: Database, problemId: string, editionId: string): Promise<CopyView> {
  const row = await database.models.editions.findByPk(editionId, { attributes: ['n'], raw: true });
  if (!row) throw new Error(`makeView: edition ${editionId} is gone`);
  const { edition, content } = await getEdition(database, problemId, row.n);
  return buildCopyView(edition, content);
}
