import { describe, expect, test } from 'vitest';
import { statisticSchema, type Quantity } from '#shared/evidence/evidence.ts';
import {
  draftOf,
  quantityDraftSchema,
  toQuantityBody,
} from '#src/features/trials/register/quantity-draft.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));
const idOf = (symbol: string) => {
  const found = evidence.quantities.find((quantity) => quantity.symbol === symbol);
  if (!found) throw new Error(`the demonstration has no ${symbol}`);
  return found.id;
};
const series = evidence.series[0]?.id ?? '';
const where = { series: [series], plusTrials: [], where: [{ quantity: idOf('h'), min: null, max: null }] };

function statistic(def: Partial<Extract<Quantity['def'], { origin: 'summary' }>>): Quantity {
  return {
    id: 'summary-1',
    symbol: 'S',
    name: 'slope of range against head',
    unit: '1',
    status: 'measured',
    def: { origin: 'summary', of: idOf('R'), stat: 'mean', where, scatter: 'group', ...def },
  };
}

/** A constant without an instrument says so. */
function withInstrument(def: Quantity['def']): Quantity['def'] {
  return def.origin === 'constant' ? { instrument: null, ...def } : def;
}

describe('a quantity', () => {
  test('opened as a form and kept unchanged: is the same quantity, however it comes by its value', () => {
    for (const quantity of evidence.quantities) {
      const { id, source, ...rest } = quantity;
      expect([id, toQuantityBody(draftOf(quantity, evidence), evidence)]).toEqual([
        id,
        { ...rest, def: withInstrument(rest.def), source: source ?? undefined },
      ]);
    }
  });

  test.each(statisticSchema.options)('as a %s of a column: keeps its trials and its scatter', (stat) => {
    const quantity = statistic({
      stat,
      scatter: 'pooled',
      ...(stat === 'slope' && { against: idOf('h') }),
    });
    const draft = quantityDraftSchema(evidence, quantity.id).parse(draftOf(quantity, evidence));

    expect(toQuantityBody(draft, evidence).def).toEqual(quantity.def);
  });

  test('as a statistic of another series: takes the whole of that series', () => {
    const other = evidence.series[1]?.id ?? '';
    const draft = { ...draftOf(statistic({}), evidence), series: other };

    expect(toQuantityBody(draft, evidence).def).toMatchObject({
      where: { series: [other], plusTrials: [], where: [] },
    });
  });

  test('as a slope against nothing, or against itself: the form says so in that field', () => {
    const draft = draftOf(statistic({ stat: 'slope' }), evidence);
    const faultOf = (against: string) =>
      quantityDraftSchema(evidence, 'summary-1')
        .safeParse({ ...draft, against })
        .error?.issues.map(({ path, message }) => [path.join('.'), message]);

    expect(faultOf('')).toEqual([['against', 'Choose what the slope is taken against.']]);
    expect(faultOf(idOf('R'))?.[0]?.[0]).toBe('against');
    expect(faultOf(idOf('h'))).toBeUndefined();
  });
});
