import type { Comparison, Evidence } from '#shared/evidence/evidence.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';

/**
 * Comparisons that the team stands behind: of the newest model, shown by a chart of the report, or tested by a claim.
 * What an earlier model missed is why there is a later one, and nobody presses there.
 *
 * @param evidence - of the problem
 * @param document - its report
 * @returns the comparisons in their order
 */
export function defendedComparisons(evidence: Evidence, document: ReportDocument): readonly Comparison[] {
  const newest = Math.max(0, ...evidence.models.map(({ n }) => n));
  const models = new Set(evidence.models.filter(({ n }) => n === newest).map(({ id }) => id));
  const charts = new Map(evidence.charts.map(({ id, comparison }) => [id, comparison]));
  const shown = new Set<string>();
  for (const node of nodesOf(document)) {
    const comparison = node.type === 'chart' ? charts.get(node.attrs.chart) : undefined;
    if (comparison !== undefined) shown.add(comparison);
  }
  for (const { test } of evidence.claims) if (test?.kind === 'model fits') shown.add(test.comparison);
  return evidence.comparisons.filter(({ id, model }) => models.has(model) || shown.has(id));
}
