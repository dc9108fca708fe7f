import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { sectionLevels } from '#shared/report/levels.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { REPORT_SECTIONS } from '#shared/report/schema/section-type.ts';

/** What is worth doing before the draft is frozen. None of it keeps anybody from freezing. */
export interface WorthDoing {
  /** Sections with numbers that follow no trial, in their order. */
  readonly notTied: readonly { readonly section: number; readonly count: number }[];
  /** Numbers of the sections in which nothing stands yet. */
  readonly blank: readonly number[];
  /** Numbers of claims, in their order. */
  readonly leaking: readonly number[];
  readonly undecided: readonly number[];
}

/** Looks a draft through as somebody would who is about to freeze it. */
export function worthDoing(document: ReportDocument, evidence: Evidence, findings: Findings): WorthDoing {
  const sections = sectionLevels(document, evidence, findings).map((found) => ({
    ...found,
    number: REPORT_SECTIONS.find(({ name }) => name === found.section)?.number ?? 0,
  }));
  const claims = (verdict: string) =>
    evidence.claims.filter(({ id }) => findings.claims.get(id)?.verdict === verdict).map(({ n }) => n);
  return {
    notTied: sections
      .filter(({ notTied }) => notTied > 0)
      .map(({ number, notTied }) => ({ section: number, count: notTied })),
    blank: sections.filter(({ level }) => level === 'Blank').map(({ number }) => number),
    leaking: claims('Leaks'),
    undecided: claims('Undecided'),
  };
}
