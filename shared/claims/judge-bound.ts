import type { ClaimTest, Evidence } from '#shared/evidence/evidence.ts';
import { fault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { ClaimFinding, Findings, Scalar } from '#shared/evidence/findings.ts';
import { figureInWords } from '#shared/evidence/words.ts';
import { formatScalar, formatValue } from '#shared/formatting/format-scalar.ts';
import { sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { readSi } from '#shared/units/reading.ts';
import { FEWEST_TRIALS } from './judge-equals.ts';
import { trialsBehind } from './trials-behind.ts';
import { tooFewTrials, undecided, withFault } from './undecided.ts';

type BoundTest = Extract<ClaimTest, { kind: 'bound' }>;

/**
 * A value against a limit: holds when the value with its expanded uncertainty k·u lies on the claimed side, leaks
 * when it lies on the other, and is undecided while the limit lies within k·u.
 */
export function judgeBound(
  blank: ClaimFinding,
  test: BoundTest,
  evidence: Evidence,
  findings: Findings,
): ClaimFinding {
  const measured = findValue(findings, evidence, test.value);
  if (measured.shape === 'fault') return withFault(blank, measured);
  const limit = readSi(test.limit);
  if (!limit.ok)
    return withFault(blank, fault(limit.code, `The limit of this claim: ${limit.sentence}`, blank.id));
  const unit = parseUnit(measured.unit);
  if (unit.ok && !sameDimension(unit.unit.dimension, limit.dimension))
    return withFault(
      blank,
      fault(
        'dimension mismatch',
        `The limit is given in ${test.limit.unit}, but the value is in ${measured.unit}. Give the limit in a unit of the same kind.`,
        blank.id,
      ),
    );
  const trials = trialsBehind(findings, evidence, test.value);
  const found: ClaimFinding = { ...blank, measured, trials };
  if (measured.u === null)
    return undecided(
      found,
      'The value has no uncertainty, so that it cannot be set against a limit.',
      'no uncertainty',
    );
  if (trials.length < FEWEST_TRIALS) {
    const { sentence, short } = tooFewTrials(trials.length, FEWEST_TRIALS);
    return undecided(found, sentence, short);
  }
  return decide(found, test, { measured, limit: limit.value, rule: evidence.settings.rounding });
}

interface Bounded {
  readonly measured: Scalar;
  readonly limit: number;
  readonly rule: Evidence['settings']['rounding'];
}

function decide(found: ClaimFinding, test: BoundTest, { measured, limit, rule }: Bounded): ClaimFinding {
  const { k } = found;
  const u = measured.u ?? 0;
  const room =
    (test.side === 'at most' ? limit - measured.value : measured.value - limit) /
    (u > 0 ? u : Number.MIN_VALUE);
  const shown = formatScalar(measured, measured.unit, rule);
  const limitText = `${test.side} ${formatLimit(test)}`;
  const size = `${figureInWords(Math.abs(room))}\u00a0u`;
  const z = u > 0 ? (measured.value - limit) / u : null;
  if (Math.abs(room) < k) {
    const needed = formatValue({ value: Math.abs(measured.value - limit) / k, u: null }, measured.unit, rule);
    return undecided(
      { ...found, z },
      `${shown} is ${size} from the limit, and ${k}\u00a0u is needed either way. An uncertainty below ${needed} would decide it.`,
      `${size} from the limit`,
    );
  }
  const holds = room > 0;
  return {
    ...found,
    z,
    verdict: holds ? 'Holds' : 'Leaks',
    sentence: `${shown} lies ${size} ${holds ? 'inside' : 'beyond'} the limit; “${limitText}” holds at ${k}\u00a0u or more inside.`,
    short: `${shown}, ${limitText}`,
  };
}

function formatLimit({ limit }: BoundTest): string {
  const gap = limit.unit === '1' || limit.unit === '' ? '' : limit.unit === '°' ? '°' : `\u00a0${limit.unit}`;
  return limit.text + gap;
}
