/** Small words for writing a demonstration report: nodes by what they are, references by what people call them. */
import type { Evidence, Reading, ValueReference } from '#shared/evidence/evidence.ts';
import type {
  BlockNode,
  InlineNode,
  ReportDocument,
  SectionNode,
} from '#shared/report/schema/report-node.ts';
import type { LiveValueAttributes } from '#shared/report/schema/live-value-node.ts';
import type { FormulaAttributes } from '#shared/report/schema/formula-node.ts';
import { REPORT_SECTIONS, type SectionName } from '#shared/report/schema/section-type.ts';

type Piece = string | InlineNode;

export const tex = (latex: string): InlineNode => ({ type: 'inlineFormula', attrs: { latex } });
export const italic = (text: string): InlineNode => ({ type: 'text', text, marks: [{ type: 'italic' }] });
export const live = (ref: ValueReference, form: LiveValueAttributes['form'] = 'value'): InlineNode => ({
  type: 'liveValue',
  attrs: { ref, form, unit: null, shown: null },
});

/** A paragraph of plain text and pieces: p`At ${live(…)} it lands short.` */
export function p(words: TemplateStringsArray, ...pieces: readonly Piece[]): BlockNode {
  const content = words.flatMap((text, index): InlineNode[] => {
    const piece = pieces[index];
    const node =
      piece === undefined
        ? []
        : [typeof piece === 'string' ? ({ type: 'text', text: piece } as const) : piece];
    return [...(text === '' ? [] : [{ type: 'text', text } as const]), ...node];
  });
  return { type: 'paragraph', content };
}

export function bullets(...items: readonly BlockNode[]): BlockNode {
  return { type: 'bulletList', content: items.map((item) => ({ type: 'listItem', content: [item] })) };
}

export function heading(text: string): BlockNode {
  return { type: 'heading', attrs: { level: 2 }, content: [{ type: 'text', text }] };
}

export function report(sections: Readonly<Record<SectionName, readonly BlockNode[]>>): ReportDocument {
  return {
    type: 'doc',
    content: REPORT_SECTIONS.map(({ type, name }): SectionNode => {
      const content = sections[name];
      return { type, content: content.length > 0 ? content : [{ type: 'paragraph' }] };
    }),
  };
}

/** Rows of the evidence by what people call them: symbols, letters, B12, numbers. Throws where there is none. */
export interface Names {
  readonly q: (symbol: string) => string;
  readonly series: (letter: string) => string;
  readonly model: (n: number) => string;
  readonly comparison: (name: RegExp) => string;
  /** The setting at which a trial was taken. */
  readonly settingOf: (trial: string) => { readonly series: string; readonly at: Record<string, Reading> };
  readonly claim: (n: number, anchor: string) => BlockNode;
  readonly chart: (n: number, anchor: string, caption: string) => BlockNode;
  readonly table: (letter: string, anchor: string, caption: string) => BlockNode;
  readonly equation: (
    anchor: string,
    model: number,
    symbol: string,
    steps: FormulaAttributes['steps'],
    place?: { readonly series: string; readonly at?: Record<string, Reading> },
  ) => BlockNode;
}

export function namesOf(evidence: Evidence): Names {
  const get = <Row extends { readonly id: string }>(
    rows: readonly Row[],
    what: string,
    is: (row: Row) => boolean,
  ): Row => {
    const row = rows.find(is);
    if (!row) throw new RangeError(`namesOf: the evidence has no ${what}`);
    return row;
  };
  const q = (symbol: string) => get(evidence.quantities, symbol, (row) => row.symbol === symbol).id;
  const seriesOf = (letter: string) =>
    get(evidence.series, `series ${letter}`, (row) => row.letter === letter);
  const model = (n: number) => get(evidence.models, `model ${n}`, (row) => row.n === n).id;
  return {
    q,
    model,
    series: (letter) => seriesOf(letter).id,
    comparison: (name) =>
      get(evidence.comparisons, `comparison ${name.source}`, (row) => name.test(row.name)).id,
    settingOf(trial) {
      const [, letter = '', number = ''] = /^([A-Z]+)(\d+)$/.exec(trial) ?? [];
      const series = seriesOf(letter);
      const { values } = get(
        evidence.trials,
        trial,
        (row) => row.series === series.id && row.number === Number(number),
      );
      const at = Object.fromEntries(series.settings.flatMap((id) => (values[id] ? [[id, values[id]]] : [])));
      return { series: series.id, at };
    },
    claim: (n, anchor) => ({
      type: 'claim',
      attrs: { anchor, claim: get(evidence.claims, `claim ${n}`, (row) => row.n === n).id },
    }),
    chart: (n, anchor, caption) => ({
      type: 'chart',
      attrs: { anchor, chart: get(evidence.charts, `chart ${n}`, (row) => row.n === n).id, caption },
    }),
    table: (letter, anchor, caption) => ({
      type: 'trialsTable',
      attrs: { anchor, series: seriesOf(letter).id, caption },
    }),
    equation: (anchor, n, symbol, steps, place) => ({
      type: 'formula',
      attrs: {
        anchor,
        kind: 'equation',
        latex: '',
        model: model(n),
        defines: q(symbol),
        series: place?.series ?? null,
        at: place?.at ?? {},
        steps,
        label: anchor,
      },
    }),
  };
}
