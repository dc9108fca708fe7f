import { createHash } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';
import { sealFigures, sealOf, type SealedParts } from '#shared/editions/seal.ts';
import { sealMarks } from '#shared/editions/seal-marks.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import { findingsToJson } from '#shared/evidence/findings-json.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00.000Z'));
const parts: SealedParts = {
  evidence,
  document: leaningSpoutReport(evidence),
  findings: findingsToJson(evaluate(evidence)),
  files: [{ sha: 'b'.repeat(64) }, { sha: 'a'.repeat(64) }],
};
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');
const seal = sealOf(parts, sha256);

describe('seal', () => {
  test('the seal, when the same content is written and parsed: is the same', () => {
    expect(sealOf(JSON.parse(JSON.stringify(parts)) as SealedParts, sha256)).toBe(seal);
    expect(seal).toMatch(/^[0-9a-f]{64}$/);
  });

  test('the seal, when the files come in another order: is the same', () => {
    expect(sealOf({ ...parts, files: [...parts.files].reverse() }, sha256)).toBe(seal);
  });

  test.each<readonly [string, SealedParts]>([
    ['one reading differs by its last figure', { ...parts, evidence: withReading('46.2') }],
    ['a file is another', { ...parts, files: [{ sha: 'c'.repeat(64) }] }],
    ['a finding is another', { ...parts, findings: { ...parts.findings, charts: {} } }],
    ['the text is another', { ...parts, document: { ...parts.document, content: [] } }],
  ])('the seal, when %s: is another', (_what, changed) => {
    expect(sealOf(changed, sha256)).not.toBe(seal);
  });

  test('the ring, when drawn: has one mark for each of the first 48 bits, from the top clockwise', () => {
    const marks = sealMarks('b7e241c09d3a0000');

    const bits = marks.map(({ kind }) => (kind === 'stroke' ? '1' : '0')).join('');
    expect(Number.parseInt(bits, 2).toString(16)).toBe('b7e241c09d3a');
    expect(marks[0]).toEqual({ kind: 'stroke', x1: 50, y1: 14, x2: 50, y2: 6 });
    expect(sealMarks('000000000001')[47]).toMatchObject({ kind: 'stroke', x1: 45.3, y1: 14.31 });
    expect(sealFigures('b7e241c09d3a0000')).toBe('b7e2 41c0 9d3a');
  });

  test('the ring, when the figures are none: is refused', () => {
    expect(() => sealMarks('seal')).toThrow(RangeError);
  });
});

function withReading(text: string): SealedParts['evidence'] {
  const trials = evidence.trials.map((trial) =>
    trial.id === 'trial-b10'
      ? { ...trial, values: { ...trial.values, 'q-r': { text, unit: 'cm', u: '0.4' } } }
      : trial,
  );
  return { ...evidence, trials };
}
