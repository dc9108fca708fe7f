import { evidenceOfCopy, findingsOfCopy } from '#shared/editions/read-copy-view.ts';
import { readPictures } from '#server/features/files/service.ts';
import { pdfFileName, type PdfFile } from '#server/rendering/pdf-file.ts';
import type { ReadingDeps } from './find-copy.ts';
import type { CopyModel } from './model.ts';
import { viewOf } from './copy-views.ts';

/** Printed copies are kept while they are asked for; they can be printed again at any time. */
const MOST_HELD = 6;

const heldBy = new WeakMap<object, Map<string, Promise<PdfFile>>>();

/** The report of a copy as PDF, made from nothing but what its reader sees, with the recipient on every page. */
export function printCopy(deps: ReadingDeps, copy: CopyModel): Promise<PdfFile> {
  let held = heldBy.get(deps.database);
  if (!held) heldBy.set(deps.database, (held = new Map()));
  const known = held.get(copy.id);
  if (known) return known;
  const printed = print(deps, copy);
  held.set(copy.id, printed);
  printed.catch(() => held.delete(copy.id));
  for (const oldest of held.keys()) {
    if (held.size <= MOST_HELD) break;
    held.delete(oldest);
  }
  return printed;
}

async function print(deps: ReadingDeps, copy: CopyModel): Promise<PdfFile> {
  const view = await viewOf(deps.database, copy);
  const { problem, team, edition } = view;
  const authors = view.authors.map((name) => ({ name, role: 'member' as const }));
  const advisors = view.advisors.map((name) => ({ name, role: 'advisor' as const }));
  const { bytes } = await deps.renderer.render({
    problem: { ...problem, owners: authors },
    team: { ...team, people: [...authors, ...advisors] },
    document: view.document,
    evidence: evidenceOfCopy(view),
    findings: findingsOfCopy(view),
    plates: await readPictures(deps, copy.problemId, view.files),
    edition: { n: edition.n, seal: edition.seal },
    lentTo: { recipient: copy.recipient, number: copy.number },
    at: edition.at,
  });
  return { name: pdfFileName(problem.title, `edition-${edition.n}-copy-${copy.number}`), bytes };
}
