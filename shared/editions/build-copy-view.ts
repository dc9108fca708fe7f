import type { Evidence, Quantity, Trial } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { findingsFromJson } from '#shared/evidence/findings-json.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { parseReportDocument } from '#shared/report/schema/parse-report-document.ts';
import type { ReportDocument, ReportNode } from '#shared/report/schema/report-node.ts';
import { reachedFindings } from './reached-findings.ts';
import { reachOf, type Reach } from './reach.ts';
import { copyViewSchema, type CopyView } from './copy-view.ts';
import type { FrozenEdition } from './frozen-edition.ts';

/**
 * An edition as its reader gets it: the report, and of everything behind it only what the report reaches. Findings are
 * taken as they were frozen; nothing is evaluated.
 *
 * @param edition - its number and its seal
 * @param content - what the edition keeps
 * @throws when the document is not a report, or something would leave that the schema has no place for
 */
export function buildCopyView(
  edition: { readonly n: number; readonly seal: string },
  content: FrozenEdition,
): CopyView {
  const parsed = parseReportDocument(content.document);
  if (!parsed.ok) throw new TypeError(`buildCopyView: ${parsed.sentence}`);
  const { evidence, problem, team } = content;
  const findings = findingsFromJson(content.findings);
  const reach = reachOf(parsed.document, evidence);
  const reached = reachedEvidence(evidence, reach);
  const namesOf = (people: typeof team.people, isAdvisor: boolean) =>
    people.filter(({ role }) => (role === 'advisor') === isAdvisor).map(({ name }) => name);
  const owners = namesOf(problem.owners, false);
  return copyViewSchema.parse({
    edition: { n: edition.n, seal: edition.seal, at: content.at, reportSchema: content.reportSchema },
    problem: { number: problem.number, title: problem.title, statement: problem.statement },
    team: { name: team.name, university: team.university, isDemo: team.isDemo },
    authors: owners.length > 0 ? owners : namesOf(team.people, false),
    advisors: namesOf(team.people, true),
    trials: reached.trials.length,
    evidence: reached,
    document: withoutFormerTexts(parsed.document, evidence, findings),
    findings: reachedFindings(content.findings, evidence, reach),
    files: content.files.map(({ sha }) => sha),
  });
}

function reachedEvidence(evidence: Evidence, reach: Reach) {
  const of = <Row extends { readonly id: string }>(rows: readonly Row[], ids: ReadonlySet<string>) =>
    rows.filter(({ id }) => ids.has(id));
  const series = of(evidence.series, reach.series);
  return {
    version: evidence.version,
    settings: evidence.settings,
    instruments: of(evidence.instruments, reach.instruments).map(({ id, name, parts }) => ({
      id,
      name,
      parts,
    })),
    quantities: of(evidence.quantities, reach.named).map((row) =>
      reach.valued.has(row.id) ? row : namedOnly(row),
    ),
    series: series.map(({ id, letter, name, held, settings, readings }) => ({
      id,
      letter,
      name,
      held,
      settings,
      readings,
    })),
    trials: evidence.trials
      .filter((trial) => reach.series.has(trial.series) && trial.withdrawn === undefined)
      .map((trial) => reachedTrial(trial, reach)),
    models: of(evidence.models, reach.models).map(({ id, n, name, equations, output, limits }) => ({
      id,
      n,
      name,
      equations,
      output,
      limits: limits.map(({ quantity, min, max }) => ({ quantity, min, max })),
    })),
    comparisons: of(evidence.comparisons, reach.comparisons),
    claims: of(evidence.claims, reach.claims).map(({ id, n, text, test }) => ({ id, n, text, test })),
    charts: of(evidence.charts, reach.charts),
  };
}

/** How a value is come by that nothing in the report is made from is nobody's business. */
function namedOnly({ id, symbol, name, unit, status }: Quantity): Quantity {
  return { id, symbol, name, unit, status, def: { origin: 'recorded', instrument: null } };
}

const DAY_LENGTH = '2026-03-03'.length;

function reachedTrial({ id, number, series, order, at, values, excluded }: Trial, reach: Reach) {
  return {
    id,
    number,
    series,
    order,
    on: at.slice(0, DAY_LENGTH),
    values: Object.fromEntries(Object.entries(values).filter(([quantity]) => reach.valued.has(quantity))),
    ...(excluded === undefined ? {} : { excluded: { reason: excluded.reason } }),
  };
}

/** A live value carries how it last read, which may be an older number: it stays only where it is what is shown. */
function withoutFormerTexts(
  document: ReportDocument,
  evidence: Evidence,
  findings: Findings,
): ReportDocument {
  const clean = <Node extends ReportNode>(node: Node): Node => {
    if (node.type === 'liveValue') {
      const isGone = isFault(findValue(findings, evidence, node.attrs.ref));
      return isGone ? node : { ...node, attrs: { ...node.attrs, shown: null } };
    }
    if (!('content' in node) || node.content === undefined) return node;
    return { ...node, content: (node.content as readonly ReportNode[]).map(clean) };
  };
  return clean(document);
}
