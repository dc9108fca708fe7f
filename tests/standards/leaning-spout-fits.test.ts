import { describe, expect, test } from 'vitest';
import { aicc } from '#shared/fitting/aicc.ts';
import type { ConvergedFit } from '#shared/fitting/fit-outcome.ts';
import { fitLeastSquares } from '#shared/fitting/fit-least-squares.ts';
import { fitWithInputUncertainties } from '#shared/fitting/fit-with-input-uncertainties.ts';
import { goodnessOfFit } from '#shared/fitting/goodness-of-fit.ts';
import { at } from '#shared/numeric/element.ts';

/*
 * An invented experiment: a can drains through a hole in its side. Means of five runs, lengths in mm, times in s.
 * The fits' values were computed independently of this code from the same numbers.
 */
const TIMES = Float64Array.of(0, 20, 40, 60, 80, 100, 120, 140, 160, 180, 200, 220);
const LEVELS = Float64Array.of(
  199.92,
  170.56,
  143.76,
  118.88,
  96.78,
  76.76,
  59.32,
  45.14,
  32.48,
  22.28,
  14.52,
  9.54,
);
const REACHES = Float64Array.of(
  434.8,
  398.4,
  365.4,
  331.2,
  296.0,
  262.8,
  228.2,
  193.8,
  159.0,
  125.2,
  92.4,
  56.8,
);
const LEVEL_SIGMA = 0.264;
const REACH_SIGMA = 0.596;
const DROP = 250;
/** (d/D)² √(g/2): what a discharge coefficient of 1 takes from the root of the level each second. */
const RATE = (3 / 84.6) ** 2 * Math.sqrt(9812.5 / 2);
/** Head that surface tension takes, from theory. */
const TENSION_HEAD = 6.204;

function converged<T extends { status: string }>(outcome: T): T & ConvergedFit {
  if (outcome.status !== 'converged') throw new Error(`fit: ${outcome.status}`);
  return outcome as T & ConvergedFit;
}

/** h(t) = head + (√h₀ − Cd · rate · t)², parameters √h₀, Cd and, if it is free, the head. */
function fitDrain(head: number | 'free'): ConvergedFit {
  const headAt = (p: Float64Array): number => (head === 'free' ? at(p, 2) : head);
  const rootAt = (p: Float64Array, time: number): number => at(p, 0) - at(p, 1) * RATE * time;
  return converged(
    fitLeastSquares({
      observations: TIMES.length,
      parameters: [{ start: 14 }, { start: 0.6 }, ...(head === 'free' ? [{ start: 1 }] : [])],
      residuals: (p, out) =>
        out.set(TIMES.map((time, i) => (headAt(p) + rootAt(p, time) ** 2 - at(LEVELS, i)) / LEVEL_SIGMA)),
      jacobian: (p, columns) => {
        columns[0]?.set(TIMES.map((time) => (2 * rootAt(p, time)) / LEVEL_SIGMA));
        columns[1]?.set(TIMES.map((time) => (-2 * RATE * time * rootAt(p, time)) / LEVEL_SIGMA));
        columns[2]?.fill(1 / LEVEL_SIGMA);
      },
    }),
  );
}

const unitReach = (level: number, head: number): number => 2 * Math.sqrt((level - head) * DROP);

/** x = 2 Cv √((h − head) H), weighted by the effective variance at Cv = 0.97. */
function fitReach(head: number): ConvergedFit {
  const sigmas = LEVELS.map((level) =>
    Math.hypot(REACH_SIGMA, 0.97 * Math.sqrt(DROP / (level - head)) * LEVEL_SIGMA),
  );
  return converged(
    fitLeastSquares({
      observations: LEVELS.length,
      parameters: [{ start: 0.5 }],
      residuals: (p, out) =>
        out.set(
          LEVELS.map((level, i) => (at(p, 0) * unitReach(level, head) - at(REACHES, i)) / at(sigmas, i)),
        ),
      jacobian: (_p, columns) =>
        columns[0]?.set(LEVELS.map((level, i) => unitReach(level, head) / at(sigmas, i))),
    }),
  );
}

/** The figure as it would be printed with so many decimals, kept a number for the message. */
const printed = (value: number | null | undefined, decimals: number): number =>
  Number((value ?? NaN).toFixed(decimals));

describe('drain, plain', () => {
  const fit = fitDrain(0);

  test('two free parameters: Cd 0.5969(9), χ² 294.2 for 10, AICc 299.5', () => {
    expect(printed(fit.parameters[1], 4)).toBe(0.5969);
    expect(printed(fit.standardErrors[1], 4)).toBe(0.0009);
    expect(printed(fit.chiSquared, 1)).toBe(294.2);
    expect(fit.degreesOfFreedom).toBe(10);
    expect(printed(aicc(fit.chiSquared, 2, 12), 1)).toBe(299.5);
    expect(goodnessOfFit(fit.chiSquared, 10).pValue).toBeLessThan(1e-50);
  });
});

describe('drain, head less the tension head from theory', () => {
  const fit = fitDrain(TENSION_HEAD);

  test('two free parameters: Cd 0.6252(10), χ² 6.2 for 10, p 0.80, AICc 11.5', () => {
    expect(printed(fit.parameters[1], 4)).toBe(0.6252);
    expect(printed(fit.standardErrors[1], 4)).toBe(0.001);
    expect(printed(fit.chiSquared, 1)).toBe(6.2);
    expect(printed(goodnessOfFit(fit.chiSquared, 10).pValue, 2)).toBe(0.8);
    expect(printed(aicc(fit.chiSquared, 2, 12), 1)).toBe(11.5);
  });
});

describe('drain, tension head free', () => {
  const fit = fitDrain('free');

  test('three free parameters: head 6.27(33) mm, Cd 0.6255(19), χ² 6.1 for 9, p 0.73, AICc 15.1', () => {
    expect(printed(fit.parameters[2], 2)).toBe(6.27);
    expect(printed(fit.standardErrors[2], 2)).toBe(0.33);
    expect(printed(fit.parameters[1], 4)).toBe(0.6255);
    expect(printed(fit.standardErrors[1], 4)).toBe(0.0019);
    expect(printed(fit.chiSquared, 1)).toBe(6.1);
    expect(fit.degreesOfFreedom).toBe(9);
    expect(printed(goodnessOfFit(fit.chiSquared, 9).pValue, 2)).toBe(0.73);
    expect(printed(aicc(fit.chiSquared, 3, 12), 1)).toBe(15.1);
  });
});

describe('reach', () => {
  test('plain: Cv 0.9555(7), χ² 1822 for 11, AICc 1825, found linear', () => {
    const fit = fitReach(0);

    expect(fit.linear).toBe(true);
    expect(printed(fit.parameters[0], 4)).toBe(0.9555);
    expect(printed(fit.standardErrors[0], 4)).toBe(0.0007);
    expect(printed(fit.chiSquared, 0)).toBe(1822);
    expect(fit.degreesOfFreedom).toBe(11);
    expect(printed(aicc(fit.chiSquared, 1, 12), 0)).toBe(1825);
  });

  test('head less the tension head: Cv 0.9858(8), χ² 13.6 for 11, p 0.26, AICc 16.0', () => {
    const fit = fitReach(TENSION_HEAD);

    expect(printed(fit.parameters[0], 4)).toBe(0.9858);
    // 0.00074984: the 8 in the fourth place comes from rounding the already rounded 0.00075.
    expect(printed(fit.standardErrors[0], 5)).toBe(0.00075);
    expect(printed(fit.chiSquared, 1)).toBe(13.6);
    expect(printed(goodnessOfFit(fit.chiSquared, 11).pValue, 2)).toBe(0.26);
    expect(printed(aicc(fit.chiSquared, 1, 12), 1)).toBe(16);
  });

  test('with the effective variance at the fitted Cv: same Cv within a tenth of its error, settled', () => {
    const { outcome, settled, rounds } = fitWithInputUncertainties({
      observed: REACHES,
      outputSigmas: REACHES.map(() => REACH_SIGMA),
      inputSigmas: [LEVELS.map(() => LEVEL_SIGMA)],
      parameters: [{ start: 0.97 }],
      model: (p, out) => out.set(LEVELS.map((level) => at(p, 0) * unitReach(level, TENSION_HEAD))),
      jacobian: (_p, columns) => columns[0]?.set(LEVELS.map((level) => unitReach(level, TENSION_HEAD))),
      inputSlopes: (p, columns) =>
        columns[0]?.set(LEVELS.map((level) => at(p, 0) * Math.sqrt(DROP / (level - TENSION_HEAD)))),
    });
    const fit = converged(outcome);

    expect(settled).toBe(true);
    expect(rounds).toBeLessThan(12);
    expect(Math.abs(at(fit.parameters, 0) - 0.9858)).toBeLessThan(0.0001);
    expect(printed(fit.chiSquared, 0)).toBe(13);
  });
});
