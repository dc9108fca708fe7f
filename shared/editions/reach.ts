/** How far a report reaches into its evidence: every row that something in it is computed from, and no other. */
import { parsedExpression } from '#shared/evidence/compiled-expression.ts';
import type { ClaimTest, Evidence, Quantity, Selection, ValueReference } from '#shared/evidence/evidence.ts';
import { registerOf } from '#shared/evidence/register.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import type { ReportDocument, ReportNode } from '#shared/report/schema/report-node.ts';

/** Ids of the rows that a report reaches. */
export interface Reach {
  /** Quantities whose value is needed. */
  readonly valued: ReadonlySet<string>;
  /** Quantities that are at least spoken of: what a model defines, what a fit leaves free. Holds the valued ones too. */
  readonly named: ReadonlySet<string>;
  readonly instruments: ReadonlySet<string>;
  readonly series: ReadonlySet<string>;
  readonly models: ReadonlySet<string>;
  readonly comparisons: ReadonlySet<string>;
  readonly claims: ReadonlySet<string>;
  readonly charts: ReadonlySet<string>;
}

/**
 * The rows that a report reaches, through everything that they are made from.
 *
 * @param document - the report
 * @param evidence - what it stands on
 */
export function reachOf(document: ReportDocument, evidence: Evidence): Reach {
  const walk = new Walk(evidence);
  for (const node of nodesOf(document)) walk.node(node);
  return walk;
}

/** Follows references; each row once, so that circles end. */
class Walk implements Reach {
  readonly valued = new Set<string>();
  readonly named = new Set<string>();
  readonly instruments = new Set<string>();
  readonly series = new Set<string>();
  readonly models = new Set<string>();
  readonly comparisons = new Set<string>();
  readonly claims = new Set<string>();
  readonly charts = new Set<string>();
  private readonly register;

  constructor(private readonly evidence: Evidence) {
    this.register = registerOf(evidence);
  }

  node(node: ReportNode): void {
    switch (node.type) {
      case 'liveValue':
        return this.value(node.attrs.ref);
      case 'chart':
        return this.chart(node.attrs.chart);
      case 'claim':
        return this.claim(node.attrs.claim);
      case 'trialsTable':
        return this.wholeSeries(node.attrs.series);
      case 'formula':
        if (node.attrs.model !== null) this.model(node.attrs.model);
        if (node.attrs.series !== null) this.wholeSeries(node.attrs.series);
        return Object.keys(node.attrs.at).forEach((id) => this.quantity(id));
      default:
    }
  }

  private value(ref: ValueReference): void {
    switch (ref.kind) {
      case 'quantity':
        if (ref.series !== undefined) this.wholeSeries(ref.series);
        return this.quantity(ref.quantity);
      case 'prediction':
        this.model(ref.model);
        return this.placed(ref);
      case 'mean':
        return this.placed(ref);
      case 'reading':
        this.wholeSeries(this.register.trials.get(ref.trial)?.series);
        return this.quantity(ref.quantity);
      case 'fit':
        return this.comparison(ref.comparison);
      case 'claim':
        return this.claim(ref.claim);
      case 'count':
        this.wholeSeries(ref.series);
        return ref.comparison === undefined ? undefined : this.comparison(ref.comparison);
      case 'difference':
        this.value(ref.a);
        this.value(ref.b);
    }
  }

  private placed(ref: Extract<ValueReference, { kind: 'mean' | 'prediction' }>): void {
    this.wholeSeries(ref.series);
    if (ref.kind === 'mean') this.quantity(ref.quantity);
    else this.named.add(ref.quantity);
    Object.keys(ref.at).forEach((id) => this.quantity(id));
  }

  private quantity(id: string): void {
    const row = this.register.quantities.get(id);
    if (row === undefined || this.valued.has(id)) return;
    this.valued.add(id);
    this.named.add(id);
    this.definition(row);
  }

  private definition({ def }: Quantity): void {
    switch (def.origin) {
      case 'constant':
      case 'recorded':
        if (def.instrument) this.instruments.add(def.instrument);
        return;
      case 'derived':
        return this.expression(def.expr);
      case 'summary':
        this.quantity(def.of);
        if (def.against !== undefined) this.quantity(def.against);
        return this.selection(def.where);
      case 'fitted':
        return this.comparison(def.comparison);
      case 'predicted':
        this.model(def.model);
    }
  }

  private expression(text: string): void {
    const parsed = parsedExpression(this.register, text);
    if (parsed.ok) parsed.expression.inputs.forEach((id) => this.quantity(id));
  }

  private selection({ series, plusTrials, where }: Selection): void {
    series.forEach((id) => this.wholeSeries(id));
    plusTrials.forEach((id) => this.wholeSeries(this.register.trials.get(id)?.series));
    where.forEach(({ quantity }) => this.quantity(quantity));
  }

  private wholeSeries(id: string | undefined): void {
    const row = id === undefined ? undefined : this.register.series.get(id);
    if (row === undefined || this.series.has(row.id)) return;
    this.series.add(row.id);
    for (const quantity of [...Object.keys(row.held), ...row.settings, ...row.readings])
      this.quantity(quantity);
  }

  private model(id: string): void {
    const row = this.register.models.get(id);
    if (row === undefined || this.models.has(id)) return;
    this.models.add(id);
    const defined = new Set(row.equations.map(({ defines }) => defines));
    for (const { defines, expr } of row.equations) {
      this.defined(defines, id);
      const parsed = parsedExpression(this.register, expr);
      const inputs = parsed.ok ? parsed.expression.inputs : [];
      // What another equation of the same model defines is not looked up in the register.
      inputs.filter((input) => !defined.has(input)).forEach((input) => this.quantity(input));
    }
    this.named.add(row.output);
    row.limits.forEach(({ quantity }) => (defined.has(quantity) ? undefined : this.quantity(quantity)));
  }

  /** A quantity that a model defines: its value in the register is needed only where it is this model's. */
  private defined(id: string, model: string): void {
    const def = this.register.quantities.get(id)?.def;
    this.named.add(id);
    if (def?.origin === 'predicted' && def.model === model) this.quantity(id);
  }

  private comparison(id: string): void {
    const row = this.register.comparisons.get(id);
    if (row === undefined || this.comparisons.has(id)) return;
    this.comparisons.add(id);
    this.model(row.model);
    this.selection(row.selection);
    row.free.forEach(({ quantity }) => this.named.add(quantity));
    const output = this.register.models.get(row.model)?.output;
    if (output !== undefined) this.quantity(output);
  }

  private claim(id: string): void {
    const row = this.register.claims.get(id);
    if (row === undefined || this.claims.has(id)) return;
    this.claims.add(id);
    if (row.test !== null) this.test(row.test);
  }

  private test(test: ClaimTest): void {
    switch (test.kind) {
      case 'equals':
        this.value(test.measured);
        return this.value(test.expected);
      case 'model fits':
        return this.comparison(test.comparison);
      case 'bound':
        this.value(test.value);
    }
  }

  private chart(id: string): void {
    const row = this.evidence.charts.find((chart) => chart.id === id);
    if (row === undefined || this.charts.has(id)) return;
    this.charts.add(id);
    this.comparison(row.comparison);
    this.quantity(row.x);
  }
}
