import { z } from 'zod';
import type { seriesBody } from '#shared/contracts/evidence.ts';
import type { Evidence, Reading, Series } from '#shared/evidence/evidence.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

/** The form of a series as typed: for each recorded quantity, what it is in this series. */
export interface SeriesDraft {
  name: string;
  rig: string;
  /** By quantity id. */
  parts: Record<string, { as: 'not used' | 'held' | 'setting' | 'reading'; held: string }>;
}

export type SeriesBody = z.infer<typeof seriesBody>;

const recorded = (evidence: Evidence) => evidence.quantities.filter(({ def }) => def.origin === 'recorded');

export function seriesDraft(series: Series | null, evidence: Evidence): SeriesDraft {
  const parts: SeriesDraft['parts'] = {};
  for (const { id, unit } of recorded(evidence)) {
    const held = series?.held[id];
    parts[id] = {
      as: held
        ? 'held'
        : series?.settings.includes(id)
          ? 'setting'
          : series?.readings.includes(id)
            ? 'reading'
            : 'not used',
      held: held
        ? `${held.text}${held.u === undefined ? '' : ` ± ${held.u}`}${held.unit === unit ? '' : ` ${held.unit}`}`
        : '',
    };
  }
  return { name: series?.name ?? '', rig: series?.rig ?? '', parts };
}

export function seriesDraftSchema(evidence: Evidence) {
  const units = new Map(evidence.quantities.map(({ id, unit }) => [id, unit]));
  return z
    .object({
      name: z
        .string()
        .trim()
        .min(1, 'Say in a few words what this series does, like "lean varied at one head".')
        .max(120),
      rig: z.string().trim().max(120),
      parts: z.record(
        z.string(),
        z.object({ as: z.enum(['not used', 'held', 'setting', 'reading']), held: z.string() }),
      ),
    })
    .superRefine((draft, context) => {
      const parts = Object.entries(draft.parts);
      for (const [id, part] of parts) {
        if (part.as !== 'held') continue;
        const parsed = parseTypedNumber(part.held, units.get(id) ?? '1');
        if (!parsed.ok)
          context.addIssue({ code: 'custom', path: ['parts', id, 'held'], message: parsed.sentence });
      }
      if (!parts.some(([, part]) => part.as === 'reading')) {
        context.addIssue({
          code: 'custom',
          path: ['parts'],
          message: 'Choose at least one quantity that is read in each trial.',
        });
      }
    });
}

/** The row to send; call it with a draft that the schema has passed. */
export function toSeriesBody(draft: SeriesDraft, evidence: Evidence): SeriesBody {
  const held: Record<string, Reading> = {};
  const settings: string[] = [];
  const readings: string[] = [];
  for (const { id, unit } of recorded(evidence)) {
    const part = draft.parts[id];
    if (part?.as === 'setting') settings.push(id);
    if (part?.as === 'reading') readings.push(id);
    if (part?.as !== 'held') continue;
    const parsed = parseTypedNumber(part.held, unit);
    if (parsed.ok) held[id] = parsed.reading;
  }
  return { name: draft.name.trim(), rig: draft.rig.trim() || undefined, held, settings, readings };
}
