import { claimWithoutTrials } from './rules/claim-without-trials.ts';
import { conditionNotChecked } from './rules/condition-not-checked.ts';
import { excludedTrial } from './rules/excluded-trial.ts';
import { fewRepeats } from './rules/few-repeats.ts';
import { leftUnexplained } from './rules/left-unexplained.ts';
import { namedNotMeasured } from './rules/named-not-measured.ts';
import { notTied } from './rules/not-tied.ts';
import { outsideTrust } from './rules/outside-trust.ts';
import { takenNotMeasured } from './rules/taken-not-measured.ts';
import type { FoundLeak, Leak, LeakForce, LeakGround, LeakRule } from './leak.ts';

/** Every kind of leak, each in a file of its own. */
export const LEAK_RULES: readonly LeakRule[] = [
  leftUnexplained,
  claimWithoutTrials,
  namedNotMeasured,
  outsideTrust,
  excludedTrial,
  takenNotMeasured,
  notTied,
  conditionNotChecked,
  fewRepeats,
];

/** Nothing presses harder than this. */
const MOST_PRESSURE = 10;
const JET_FROM = 4;
const BURST_FROM = 7;

/**
 * Where an opponent will press, the hardest first. The pressure orders leaks and gives the word; it is a judgement of
 * the trade (common practice, no source), and never shown as a figure.
 *
 * @param ground - evidence with its findings, and the report
 * @returns leaks in decreasing pressure, equal ones by identity; the same ground gives the same list
 */
export function findLeaks(ground: LeakGround): readonly Leak[] {
  const leaks = LEAK_RULES.flatMap((rule) => rule.find(ground).map((found) => toLeak(rule, found)));
  return leaks.sort((a, b) => b.pressure - a.pressure || (a.id < b.id ? -1 : 1));
}

function toLeak({ name, code }: LeakRule, { about, ...found }: FoundLeak): Leak {
  const pressure = Math.min(MOST_PRESSURE, found.pressure);
  return {
    ...found,
    pressure,
    name,
    id: [code, ...[...about].sort()].join(':'),
    force: leakForce(pressure),
    basis: `${found.question} ${found.evidence}`,
  };
}

/**
 * The word for a pressure.
 *
 * @example leakForce(3.9) // => 'trickle'
 * @example leakForce(7) // => 'burst'
 */
export function leakForce(pressure: number): LeakForce {
  if (pressure >= BURST_FROM) return 'burst';
  return pressure >= JET_FROM ? 'jet' : 'trickle';
}
