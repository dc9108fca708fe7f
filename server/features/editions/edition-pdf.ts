import type { FrozenEdition } from '#shared/editions/frozen-edition.ts';
import { findingsFromJson } from '#shared/evidence/findings-json.ts';
import type { ServerDeps } from '#server/deps.ts';
import { readPictures } from '#server/features/files/service.ts';
import type { ReportPdf } from '#server/rendering/report-pdf.ts';

export type PrintedEdition = ReportPdf;

/** Prints an edition from nothing but what it keeps: the same bytes for the same content. */
export async function printEdition(
  deps: ServerDeps,
  problemId: string,
  edition: { readonly n: number; readonly seal: string; readonly content: FrozenEdition },
): Promise<PrintedEdition> {
  const { content, n, seal } = edition;
  const shas = content.files.map(({ sha }) => sha);
  return deps.renderer.render({
    problem: content.problem,
    team: content.team,
    document: content.document,
    evidence: content.evidence,
    findings: findingsFromJson(content.findings),
    plates: await readPictures(deps, problemId, shas),
    edition: { n, seal },
    at: content.at,
  });
}
