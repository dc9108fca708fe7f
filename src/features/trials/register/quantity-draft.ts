import { z } from 'zod';
import type { quantityBody } from '#shared/contracts/evidence.ts';
import type { Evidence, Quantity, Selection, Statistic } from '#shared/evidence/evidence.ts';
import { selectionSchema, statisticSchema, uncertaintyPartSchema } from '#shared/evidence/evidence.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import { toShown } from '#shared/expressions/stored-form.ts';
import { sameSymbol, symbolFault } from '#shared/formatting/symbol.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

/** How a quantity comes by its value, in the words of the form. */
export const ORIGINS = {
  recorded: 'read in every trial',
  constant: 'one value',
  derived: 'worked out from others',
  fitted: 'found by a comparison',
  predicted: 'defined by a model',
  summary: 'a statistic of a column',
} as const;
export type Origin = keyof typeof ORIGINS;

/** The form as typed; nothing is checked yet. */
export interface QuantityDraft {
  symbol: string;
  name: string;
  unit: string;
  status: Quantity['status'];
  source: string;
  origin: Origin;
  /** constant: as typed, `12.0 ± 0.1`; empty: named, not measured. */
  reading: string;
  instrument: string;
  parts: z.infer<typeof uncertaintyPartSchema>[];
  /** derived: the expression by symbols. */
  expr: string;
  /** fitted: the comparison; predicted: the model; summary: the column. */
  from: string;
  /** summary: which statistic, and over which series. */
  stat: Statistic;
  series: string;
  /** slope: the quantity on the horizontal axis. */
  against: string;
  /** mean, median: what the scatter is taken from. */
  scatter: 'group' | 'pooled';
  /** summary: the trials as chosen before; kept while the series stays. */
  selection: Selection | null;
}

export type QuantityBody = z.infer<typeof quantityBody>;

/** Status that goes with an origin unless the team says otherwise. */
export function usualStatus(origin: Origin): Quantity['status'] {
  if (origin === 'fitted') return 'fitted';
  if (origin === 'predicted') return 'predicted';
  return 'measured';
}

export function emptyDraft(): QuantityDraft {
  return {
    symbol: '',
    name: '',
    unit: '',
    status: 'measured',
    source: '',
    origin: 'recorded',
    reading: '',
    instrument: '',
    parts: [],
    expr: '',
    from: '',
    stat: 'mean',
    series: '',
    against: '',
    scatter: 'group',
    selection: null,
  };
}

export function draftOf(quantity: Quantity, evidence: Evidence): QuantityDraft {
  const { def } = quantity;
  const reading = def.origin === 'constant' ? def.reading : null;
  return {
    ...emptyDraft(),
    symbol: quantity.symbol,
    name: quantity.name,
    unit: quantity.unit,
    status: quantity.status,
    source: quantity.source ?? '',
    origin: def.origin,
    reading: reading
      ? `${reading.text}${reading.u === undefined ? '' : ` ± ${reading.u}`}${reading.unit === quantity.unit ? '' : ` ${reading.unit}`}`
      : '',
    instrument: ('instrument' in def ? def.instrument : null) ?? '',
    parts: def.origin === 'constant' ? [...def.parts] : [],
    expr: def.origin === 'derived' ? toShown(def.expr, evidence.quantities) : '',
    from: sourceOf(def),
    ...(def.origin === 'summary' && {
      stat: def.stat,
      series: def.where.series[0] ?? '',
      against: def.against ?? '',
      scatter: def.scatter,
      selection: def.where,
    }),
  };
}

function sourceOf(def: Quantity['def']): string {
  switch (def.origin) {
    case 'fitted':
      return def.comparison;
    case 'predicted':
      return def.model;
    case 'summary':
      return def.of;
    default:
      return '';
  }
}

/** Checks of the form that need the register: `id` is the quantity being changed, null for a new one. */
export function quantityDraftSchema(evidence: Evidence, id: string | null) {
  return z
    .object({
      symbol: z.string().trim().min(1, 'Give it a symbol: a letter or a Greek letter.').max(24),
      name: z.string().trim().min(1, 'Say in words what it is.').max(120),
      unit: z.string().trim().max(40),
      status: z.enum(['measured', 'published', 'assumed', 'fitted', 'predicted']),
      source: z.string().trim().max(400),
      origin: z.enum(Object.keys(ORIGINS) as [Origin, ...Origin[]]),
      reading: z.string().trim().max(80),
      instrument: z.string(),
      parts: z.array(uncertaintyPartSchema).max(20),
      expr: z.string().trim().max(2000),
      from: z.string(),
      stat: statisticSchema,
      series: z.string(),
      against: z.string(),
      scatter: z.enum(['group', 'pooled']),
      selection: selectionSchema.nullable(),
    })
    .superRefine((draft, context) => {
      const refuse = (field: keyof QuantityDraft, message: string | null | undefined) => {
        if (message) context.addIssue({ code: 'custom', path: [field], message });
      };
      refuse('symbol', symbolFault(draft.symbol) ?? clash(draft.symbol, evidence, id));
      refuse('unit', unitFault(draft.unit));
      if (draft.origin === 'constant') refuse('reading', readingFault(draft.reading, draft.unit));
      if (draft.origin === 'derived') refuse('expr', expressionFault(draft.expr, evidence));
      if (draft.origin === 'fitted' && draft.from === '')
        refuse('from', 'Choose the comparison that finds it.');
      if (draft.origin === 'predicted' && draft.from === '')
        refuse('from', 'Choose the model that defines it.');
      if (draft.origin === 'summary') {
        refuse('from', draft.from === '' ? 'Choose the column.' : null);
        refuse('series', draft.series === '' ? 'Choose the series.' : null);
        if (draft.stat === 'slope') refuse('against', againstFault(draft));
      }
      if (draft.status === 'published' && draft.source === '') {
        refuse('source', 'Say where the published value comes from.');
      }
    });
}

function againstFault({ against, from }: Pick<QuantityDraft, 'against' | 'from'>): string | null {
  if (against === '') return 'Choose what the slope is taken against.';
  return against === from ? 'A slope needs two different quantities. Choose another.' : null;
}

function clash(symbol: string, evidence: Evidence, id: string | null): string | null {
  const other = evidence.quantities.find(
    (quantity) => quantity.id !== id && sameSymbol(quantity.symbol, symbol),
  );
  return other
    ? `${symbol} is the ${other.name} already. Use another letter or add a subscript, like ${symbol}_2.`
    : null;
}

function unitFault(unit: string): string | null {
  const parsed = parseUnit(unit === '' ? '1' : unit);
  return parsed.ok ? null : parsed.sentence;
}

function readingFault(reading: string, unit: string): string | null {
  if (reading === '') return null;
  const parsed = parseTypedNumber(reading, unit === '' ? '1' : unit);
  return parsed.ok ? null : parsed.sentence;
}

function expressionFault(expr: string, evidence: Evidence): string | null {
  if (expr === '') return 'Write how it is worked out, like C_v^2*h.';
  const parsed = parseExpression(expr, evidence.quantities);
  return parsed.ok ? null : parsed.fault.sentence;
}

/** The row to send; call it with a draft that the schema has passed. */
export function toQuantityBody(draft: QuantityDraft, evidence: Evidence): QuantityBody {
  return {
    symbol: draft.symbol.trim(),
    name: draft.name.trim(),
    unit: draft.unit.trim() || '1',
    status: draft.status,
    source: draft.source.trim() || undefined,
    def: definitionOf(draft, evidence),
  };
}

function definitionOf(draft: QuantityDraft, evidence: Evidence): QuantityBody['def'] {
  switch (draft.origin) {
    case 'recorded':
      return { origin: 'recorded', instrument: draft.instrument || null };
    case 'constant': {
      const parsed = draft.reading === '' ? null : parseTypedNumber(draft.reading, draft.unit.trim() || '1');
      return {
        origin: 'constant',
        reading: parsed?.ok ? parsed.reading : null,
        instrument: draft.instrument || null,
        parts: draft.parts,
      };
    }
    case 'derived': {
      const parsed = parseExpression(draft.expr, evidence.quantities);
      return { origin: 'derived', expr: parsed.ok ? parsed.expression.stored : draft.expr };
    }
    case 'fitted':
      return { origin: 'fitted', comparison: draft.from };
    case 'predicted':
      return { origin: 'predicted', model: draft.from };
    case 'summary':
      return {
        origin: 'summary',
        of: draft.from,
        ...(draft.stat === 'slope' && { against: draft.against }),
        stat: draft.stat,
        where:
          draft.selection?.series[0] === draft.series
            ? draft.selection
            : { series: [draft.series], plusTrials: [], where: [] },
        scatter: draft.scatter,
      };
  }
}
