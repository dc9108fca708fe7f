import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { ClaimFinding } from '#shared/evidence/findings.ts';
import { turningSentence } from '#src/features/claims/view/turning-sentence.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));
const findings = evaluate(evidence);
const claim = (n: number) => {
  const found = evidence.claims.find((row) => row.n === n);
  if (!found) throw new Error(`the demonstration has no claim ${n}`);
  return found;
};
const finding = (n: number): ClaimFinding => {
  const found = findings.claims.get(claim(n).id);
  if (!found) throw new Error(`the demonstration has no finding ${n}`);
  return found;
};

describe('what would turn a claim', () => {
  test('one that leaks: says the measured value at which |z| is k', () => {
    const leaking = finding(3);
    const { measured, expected, difference } = leaking;
    const sentence = turningSentence(claim(3), leaking, 'one or two digits');
    const said = Number(/to ([\d.]+)\u00a0cm/.exec(sentence ?? '')?.[1]) / 100;

    expect(sentence).toMatch(/^It would hold if the measured value rose to 46\.\d\u00a0cm\.$/);
    expect(Math.abs(said - (expected?.value ?? 0)) / (difference?.u ?? 1)).toBeCloseTo(2, 0);
    expect(said).toBeGreaterThan(measured?.value ?? Infinity);
  });

  test('one that holds with a wide margin: says where it would leak, on the side it leans to', () => {
    const sentence = turningSentence(
      claim(3),
      { ...finding(3), verdict: 'Holds', k: 4 },
      'one or two digits',
    );

    expect(sentence).toMatch(/^It would leak if the measured value fell to 4[45]\.\d\u00a0cm\.$/);
  });

  test('one that hangs on a whole fit, or is undecided: says nothing', () => {
    expect(turningSentence(claim(1), finding(1), 'one or two digits')).toBeNull();
    expect(turningSentence(claim(4), finding(4), 'one or two digits')).toBeNull();
  });
});
