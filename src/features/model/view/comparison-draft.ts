import { z } from 'zod';
import type { comparisonBody } from '#shared/contracts/evidence.ts';
import type { Comparison, Evidence } from '#shared/evidence/evidence.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

/** The form of a comparison, as typed. */
export interface ComparisonDraft {
  name: string;
  series: string[];
  /** Trials of other series that count too, by name: "A1, A2". */
  plusTrials: string;
  where: { quantity: string; min: string; max: string }[];
  free: { quantity: string; start: string; min: string; max: string }[];
  weights: Comparison['weights'];
}

export type ComparisonBody = z.infer<typeof comparisonBody>;

export function comparisonDraft(comparison: Comparison | null, evidence: Evidence): ComparisonDraft {
  if (!comparison) return { name: '', series: [], plusTrials: '', where: [], free: [], weights: 'absolute' };
  const unitOf = unitsOf(evidence);
  const typed = (reading: { text: string; unit: string } | null, quantity: string) =>
    !reading ? '' : reading.unit === unitOf(quantity) ? reading.text : `${reading.text} ${reading.unit}`;
  return {
    name: comparison.name,
    series: [...comparison.selection.series],
    plusTrials: comparison.selection.plusTrials.flatMap((id) => nameOf(id, evidence) ?? []).join(', '),
    where: comparison.selection.where.map(({ quantity, min, max }) => ({
      quantity,
      min: typed(min, quantity),
      max: typed(max, quantity),
    })),
    free: comparison.free.map(({ quantity, start, min, max }) => ({
      quantity,
      start: typed(start, quantity),
      min: typed(min, quantity),
      max: typed(max, quantity),
    })),
    weights: comparison.weights,
  };
}

const unitsOf = (evidence: Evidence) => {
  const units = new Map(evidence.quantities.map(({ id, unit }) => [id, unit]));
  return (quantity: string) => units.get(quantity) ?? '1';
};

function nameOf(trial: string, evidence: Evidence): string | null {
  const found = evidence.trials.find(({ id }) => id === trial);
  const letter = evidence.series.find(({ id }) => id === found?.series)?.letter;
  return found && letter ? `${letter}${found.number}` : null;
}

function findTrial(name: string, evidence: Evidence): string | null {
  const [, letter, number] = /^([A-Z]{1,2})(\d+)$/i.exec(name) ?? [];
  const series = evidence.series.find((one) => one.letter === letter?.toUpperCase());
  return (
    evidence.trials.find((trial) => trial.series === series?.id && trial.number === Number(number))?.id ??
    null
  );
}

const names = (text: string) => text.split(/[\s,;]+/).filter(Boolean);

export function comparisonDraftSchema(evidence: Evidence) {
  const unitOf = unitsOf(evidence);
  return z
    .object({
      name: z.string().trim().min(1, 'Name it in a few words, like "series B, lean varied".').max(120),
      series: z.array(z.string()).min(1, 'Choose at least one series.'),
      plusTrials: z.string(),
      where: z.array(
        z.object({ quantity: z.string().min(1, 'Choose a quantity.'), min: z.string(), max: z.string() }),
      ),
      free: z.array(
        z.object({
          quantity: z.string().min(1, 'Choose what is to be found.'),
          start: z.string().trim(),
          min: z.string().trim(),
          max: z.string().trim(),
        }),
      ),
      weights: z.enum(['absolute', 'relative']),
    })
    .superRefine((draft, context) => {
      const check = (path: (string | number)[], text: string, quantity: string, isNeeded: boolean) => {
        if (text.trim() === '') {
          if (isNeeded)
            context.addIssue({
              code: 'custom',
              path,
              message: 'Write where the search begins; a rough value will do.',
            });
          return;
        }
        const parsed = parseTypedNumber(text, unitOf(quantity));
        if (!parsed.ok) context.addIssue({ code: 'custom', path, message: parsed.sentence });
      };
      const unknown = names(draft.plusTrials).filter((name) => findTrial(name, evidence) === null);
      if (unknown.length > 0) {
        context.addIssue({
          code: 'custom',
          path: ['plusTrials'],
          message: `There is no trial ${unknown.join(', ')}.`,
        });
      }
      draft.where.forEach(({ quantity, min, max }, index) => {
        check(['where', index, 'min'], min, quantity, false);
        check(['where', index, 'max'], max, quantity, false);
      });
      draft.free.forEach(({ quantity, start, min, max }, index) => {
        check(['free', index, 'start'], start, quantity, true);
        check(['free', index, 'min'], min, quantity, false);
        check(['free', index, 'max'], max, quantity, false);
      });
    });
}

/** The row to send; call it with a draft that the schema has passed. */
export function toComparisonBody(draft: ComparisonDraft, model: string, evidence: Evidence): ComparisonBody {
  const unitOf = unitsOf(evidence);
  const reading = (text: string, quantity: string) => {
    const parsed = text.trim() === '' ? null : parseTypedNumber(text, unitOf(quantity));
    return parsed?.ok ? parsed.reading : null;
  };
  return {
    name: draft.name.trim(),
    model,
    selection: {
      series: draft.series,
      plusTrials: names(draft.plusTrials).flatMap((name) => findTrial(name, evidence) ?? []),
      where: draft.where.map(({ quantity, min, max }) => ({
        quantity,
        min: reading(min, quantity),
        max: reading(max, quantity),
      })),
    },
    free: draft.free.flatMap(({ quantity, start, min, max }) => {
      const begin = reading(start, quantity);
      return begin
        ? [{ quantity, start: begin, min: reading(min, quantity), max: reading(max, quantity) }]
        : [];
    }),
    weights: draft.weights,
  };
}
