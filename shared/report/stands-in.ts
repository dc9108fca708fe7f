/** Where else a value stands: the claims that rest on it, the figures that draw it, other lines that tie it. */
import type { ClaimTest, Evidence, Selection, ValueReference } from '#shared/evidence/evidence.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { registerOf } from '#shared/evidence/register.ts';
import { listInWords } from '#shared/evidence/words.ts';
import { blockNumbers } from './block-numbers.ts';
import type { ReportDocument } from './schema/report-node.ts';

/**
 * "Stands in claim 3, Figure 4, and two other lines."; null when it stands nowhere but here.
 *
 * @param document - the report as it is now
 */
export function standsInSentence(
  ref: ValueReference,
  document: ReportDocument,
  evidence: Evidence,
  findings: Findings,
): string | null {
  const key = keyOf(ref);
  const claims = evidence.claims
    .filter(({ id, test }) => test !== null && restsOn(test, key) && findings.claims.has(id))
    .map(({ n }) => `claim ${n}`);
  const lines = countOf(document, key);
  const here = lines > 1 ? [`${lines - 1} other ${lines === 2 ? 'line' : 'lines'}`] : [];
  const places = [...claims, ...figuresOf(ref, document, evidence), ...here];
  if (places.length === 0) return null;
  return `Stands in ${listInWords([...places, lines > 0 ? 'this line' : ''].filter((place) => place !== ''))}.`;
}

function restsOn(test: ClaimTest, key: string): boolean {
  if (test.kind === 'equals') return keyOf(test.measured) === key || keyOf(test.expected) === key;
  return test.kind === 'bound' && keyOf(test.value) === key;
}

/** Charts whose comparison is about the quantity in that series. */
function figuresOf(ref: ValueReference, document: ReportDocument, evidence: Evidence): readonly string[] {
  if (ref.kind !== 'mean' && ref.kind !== 'prediction' && ref.kind !== 'reading') return [];
  const register = registerOf(evidence);
  const series = ref.kind === 'reading' ? register.trials.get(ref.trial)?.series : ref.series;
  const drawn = new Set(
    evidence.charts
      .filter(({ comparison }) => {
        const row = register.comparisons.get(comparison);
        const output = row === undefined ? undefined : register.models.get(row.model)?.output;
        return row !== undefined && output === ref.quantity && selects(row.selection, series, evidence);
      })
      .map(({ id }) => id),
  );
  const numbers = blockNumbers(document).figures;
  return chartsIn(document)
    .filter(({ chart }) => drawn.has(chart))
    .map(({ anchor }) => `Figure ${numbers.get(anchor) ?? ''}`);
}

function selects(selection: Selection, series: string | undefined, evidence: Evidence): boolean {
  if (series === undefined) return false;
  if (selection.series.includes(series)) return true;
  return evidence.trials.some((trial) => trial.series === series && selection.plusTrials.includes(trial.id));
}

interface AnyNode {
  readonly type: string;
  readonly attrs?: object;
  readonly content?: readonly AnyNode[];
}

function chartsIn(document: ReportDocument): readonly { chart: string; anchor: string }[] {
  const charts: { chart: string; anchor: string }[] = [];
  walk(document, (node) => {
    if (node.type === 'chart') charts.push(node.attrs as { chart: string; anchor: string });
  });
  return charts;
}

function countOf(document: ReportDocument, key: string): number {
  let count = 0;
  walk(document, (node) => {
    if (node.type !== 'liveValue') return;
    const { ref } = node.attrs as { ref: ValueReference | null };
    if (ref !== null && keyOf(ref) === key) count += 1;
  });
  return count;
}

function walk(node: AnyNode, visit: (node: AnyNode) => void): void {
  visit(node);
  node.content?.forEach((child) => walk(child, visit));
}
