import { z } from 'zod';
import type { modelBody } from '#shared/contracts/evidence.ts';
import type { Evidence, Model, Reading } from '#shared/evidence/evidence.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import { toShown } from '#shared/expressions/stored-form.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

/** The form of a model, as typed. */
export interface ModelDraft {
  name: string;
  equations: { defines: string; expr: string }[];
  output: string;
  limits: { quantity: string; min: string; max: string; reason: string }[];
  assumptions: { text: string; neglects: string }[];
}

export type ModelBody = z.infer<typeof modelBody>;

export function modelDraft(model: Model | null, evidence: Evidence): ModelDraft {
  if (!model) {
    return { name: '', equations: [{ defines: '', expr: '' }], output: '', limits: [], assumptions: [] };
  }
  return {
    name: model.name ?? '',
    equations: model.equations.map(({ defines, expr }) => ({
      defines,
      expr: toShown(expr, evidence.quantities),
    })),
    output: model.output,
    limits: model.limits.map(({ quantity, min, max, reason }) => ({
      quantity,
      min: typed(min, quantity, evidence),
      max: typed(max, quantity, evidence),
      reason: reason ?? '',
    })),
    assumptions: model.assumptions.map(({ text, neglects }) => ({ text, neglects: neglects ?? '' })),
  };
}

function typed(reading: Reading | null, quantity: string, evidence: Evidence): string {
  if (!reading) return '';
  return reading.unit === unitOf(quantity, evidence) ? reading.text : `${reading.text} ${reading.unit}`;
}

function unitOf(quantity: string, evidence: Evidence): string {
  return evidence.quantities.find(({ id }) => id === quantity)?.unit ?? '1';
}

/** Checks that need the register. Units that disagree are shown, not refused: a thought may be kept half done. */
export function modelDraftSchema(evidence: Evidence) {
  return z
    .object({
      name: z.string().trim().max(120),
      equations: z
        .array(z.object({ defines: z.string().min(1, 'Choose what it defines.'), expr: z.string().trim() }))
        .min(1, 'Write at least one equation.'),
      output: z.string().min(1, 'Choose what is set against the trials.'),
      limits: z.array(
        z.object({
          quantity: z.string().min(1, 'Choose a quantity.'),
          min: z.string(),
          max: z.string(),
          reason: z.string().trim().max(400),
        }),
      ),
      assumptions: z.array(
        z.object({
          text: z.string().trim().min(1, 'Say what is assumed.').max(400),
          neglects: z.string().trim().max(120),
        }),
      ),
    })
    .superRefine(({ equations, output, limits }, context) => {
      const refuse = (path: (string | number)[], message: string) =>
        context.addIssue({ code: 'custom', path, message });
      equations.forEach(({ defines, expr }, index) => {
        if (expr === '') refuse(['equations', index, 'expr'], 'Write the right side, like C_v^2*h.');
        else {
          const parsed = parseExpression(expr, evidence.quantities);
          if (!parsed.ok) refuse(['equations', index, 'expr'], parsed.fault.sentence);
        }
        if (defines && equations.findIndex((other) => other.defines === defines) < index) {
          refuse(['equations', index, 'defines'], 'Another equation of this model defines it already.');
        }
      });
      if (output && !equations.some(({ defines }) => defines === output)) {
        refuse(['output'], 'No equation of this model defines it.');
      }
      limits.forEach(({ quantity, min, max }, index) => {
        for (const [end, text] of [
          ['min', min],
          ['max', max],
        ] as const) {
          const parsed = text.trim() === '' ? null : parseTypedNumber(text, unitOf(quantity, evidence));
          if (parsed && !parsed.ok) refuse(['limits', index, end], parsed.sentence);
        }
        if (min.trim() === '' && max.trim() === '')
          refuse(['limits', index, 'min'], 'Write at least one end.');
      });
    });
}

/** The row to send; call it with a draft that the schema has passed. */
export function toModelBody(draft: ModelDraft, evidence: Evidence): ModelBody {
  const reading = (text: string, quantity: string): Reading | null => {
    const parsed = text.trim() === '' ? null : parseTypedNumber(text, unitOf(quantity, evidence));
    return parsed?.ok ? parsed.reading : null;
  };
  return {
    name: draft.name.trim() || undefined,
    equations: draft.equations.map(({ defines, expr }) => {
      const parsed = parseExpression(expr, evidence.quantities);
      return { defines, expr: parsed.ok ? parsed.expression.stored : expr };
    }),
    output: draft.output,
    limits: draft.limits.map(({ quantity, min, max, reason }) => ({
      quantity,
      min: reading(min, quantity),
      max: reading(max, quantity),
      reason: reason.trim() || undefined,
    })),
    assumptions: draft.assumptions.map(({ text, neglects }) => ({
      text: text.trim(),
      neglects: neglects.trim() || undefined,
    })),
  };
}
