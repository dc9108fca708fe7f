import { describe, expect, test } from 'vitest';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { brakedMagnetEvidence } from '#server/database/seeders/demo/braked-magnet-evidence.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { findingsFromJson, findingsToJson, type FindingsJson } from '#shared/evidence/findings-json.ts';
import type { Column, Findings } from '#shared/evidence/findings.ts';
import { showValue } from '#shared/report/live-value.ts';
import { spring } from './small-evidence.ts';

const FIRST_START = new Date('2026-03-03T12:00:00.000Z');
const SPOUT = leaningSpoutEvidence(FIRST_START);

const throughText = (findings: Findings): Findings =>
  findingsFromJson(JSON.parse(JSON.stringify(findingsToJson(findings))) as FindingsJson);

describe('findings as JSON', () => {
  test.each<readonly [string, Evidence]>([
    ['the leaning spout', SPOUT],
    ['the braked magnet', brakedMagnetEvidence(FIRST_START)],
    ['a spring', spring()],
  ])('findings of %s, when written and read: are the same, maps, columns and all', (_name, evidence) => {
    const findings = evaluate(evidence);

    expect(throughText(findings)).toEqual(findings);
  });

  test('findings, when a source is known without limit: keep their endless degrees of freedom', () => {
    const read = throughText(evaluate(SPOUT));

    expect([...read.sources.values()].some(({ degreesOfFreedom }) => degreesOfFreedom === Infinity)).toBe(
      true,
    );
  });

  test('findings, when a trial could not be read: keep what is no number, apart from what is not known', () => {
    const column: Column = {
      shape: 'column',
      trials: ['t-1', 't-2'],
      values: Float64Array.of(1, NaN),
      own: Float64Array.of(0.5, -Infinity),
      shared: [{ source: 'inst:rule:offset', c: Float64Array.of(0.1, NaN) }],
      apart: Float64Array.of(0, 1),
      unit: 'cm',
      hue: 'measured',
      warnings: [],
    };
    const findings = { ...evaluate(SPOUT), values: new Map([['q', column]]) };

    expect(throughText(findings).values.get('q')).toEqual(column);
    expect(JSON.stringify(findingsToJson(findings))).toContain('"values":[1,{"notFinite":"NaN"}]');
  });

  test('a value that the report shows, when its findings were written and read: reads the same', () => {
    const findings = evaluate(SPOUT);
    const ref = { kind: 'quantity', quantity: SPOUT.quantities[0]?.id ?? '', series: 'series-b' } as const;

    const shown = showValue(ref, 'value', null, SPOUT, throughText(findings));

    expect(shown).toEqual(showValue(ref, 'value', null, SPOUT, findings));
  });

  test('findings, when a part of them is missing: are refused by its name', () => {
    const { claims: _claims, ...rest } = findingsToJson(evaluate(SPOUT));

    expect(() => findingsFromJson(rest as unknown as FindingsJson)).toThrow('needs claims');
  });
});
