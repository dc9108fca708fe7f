/** What a fit hands on: statistical and shared parts, exact sensitivities, residuals of fitted trials. */
import { describe, expect, test } from 'vitest';
import { covariance } from '#shared/uncertainty/covariance.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ComparisonFinding, Scalar } from '#shared/evidence/findings.ts';
import {
  comparison,
  constant,
  evidence,
  model,
  quantity,
  reading,
  recorded,
  ruler,
  series,
  spring,
  trial,
} from './small-evidence.ts';

function scalarOf(of: Evidence, id: string): Scalar {
  const found = evaluate(of).values.get(id);
  if (found?.shape !== 'scalar') throw new Error(`${id} is no scalar: ${JSON.stringify(found)}`);
  return found;
}

function fitOf(of: Evidence, id = 'c1'): ComparisonFinding {
  const found = evaluate(of).comparisons.get(id);
  if (found === undefined || found.fault !== undefined)
    throw new Error(found?.fault?.sentence ?? 'no comparison');
  return found;
}

function partOf(scalar: Scalar, source: string): number {
  return scalar.parts.find((part) => part.source === source)?.c ?? 0;
}

/** A decay whose time is known with an error of its own, and whose amplitude reads with a scale error in common. */
function decay(
  shift: { readonly gain?: number; readonly offset?: number; readonly k0?: number } = {},
): Evidence {
  const [gain, offset, k0] = [shift.gain ?? 0, shift.offset ?? 0, shift.k0 ?? 0];
  const readings = [9.12, 6.6, 5.11, 3.62, 2.81, 2.04, 1.49, 1.17];
  return evidence({
    instruments: [
      {
        id: 'meter',
        name: 'meter',
        parts: [
          { kind: 'stated', amount: '0.05', unit: 'V', shape: 'normal', shared: false },
          { kind: 'scale', amount: '0.02', unit: '1', shape: 'normal', shared: true },
        ],
      },
      ruler('clock', '0.04', '0.03', 's'),
    ],
    quantities: [
      recorded('t', 's', 'clock'),
      recorded('v', 'V', 'meter'),
      constant('b', reading(String(0.2 + k0), 'V', '0.01')),
      quantity('a', 'V', { origin: 'fitted', comparison: 'c1' }),
      quantity('k', '1/s', { origin: 'fitted', comparison: 'c1' }),
    ],
    series: [series('A', ['t'], ['v'])],
    trials: readings.map((value, i) =>
      trial('A', i + 1, {
        t: reading((i + offset).toPrecision(15), 's'),
        v: reading((value * (1 + gain)).toPrecision(15), 'V'),
      }),
    ),
    models: [model('m1', 1, 'v', [{ defines: 'v', expr: '{a}*exp(-{k}*{t}) + {b}' }])],
    comparisons: [comparison('c1', 'm1', ['A'], { a: reading('8', 'V'), k: reading('0.2', '1/s') })],
  });
}

describe('sensitivities of a fit to shared sources', () => {
  // A small step of the source, in its standard uncertainties; the refit's own curvature enters by its square.
  const STEP = 0.01;
  const refit = (id: string, up: Evidence, down: Evidence): number =>
    (scalarOf(up, id).value - scalarOf(down, id).value) / (2 * STEP);

  test.each([
    ['a', 'inst:meter:gain', { gain: 0.02 * STEP }],
    ['k', 'inst:meter:gain', { gain: 0.02 * STEP }],
    ['a', 'inst:clock:offset', { offset: 0.03 * STEP }],
    ['a', 'const:b:own', { k0: 0.01 * STEP }],
    ['k', 'const:b:own', { k0: 0.01 * STEP }],
  ] as const)('%s by %s: as a refit with the source moved says', (id, source, move) => {
    const back = Object.fromEntries(Object.entries(move).map(([name, by]) => [name, -by]));

    const expected = refit(id, decay(move), decay(back));

    expect(partOf(scalarOf(decay(), id), source)).toAgreeTo(expected, { digits: 4 });
  });

  test('a clock that starts late: leaves the rate of the decay alone', () => {
    expect(Math.abs(partOf(scalarOf(decay(), 'k'), 'inst:clock:offset'))).toBeLessThan(1e-9);
  });

  test('the parts of a parameter: statistical and shared are kept apart and add in quadrature', () => {
    const [a] = fitOf(decay()).parameters;

    expect(a?.uFit).toBeGreaterThan(0);
    expect(a?.uShared).toBeGreaterThan(0);
    expect(a?.u).toAgreeTo(Math.hypot(a?.uFit ?? NaN, a?.uShared ?? NaN), { digits: 12 });
  });

  test('parameters of one fit: their statistical covariance is that of the fit', () => {
    const of = decay();
    const [a, k] = [scalarOf(of, 'a'), scalarOf(of, 'k')];
    const statistical = (scalar: Scalar) => scalar.parts.filter(({ source }) => source.startsWith('fit:'));

    const matrix = fitOf(of).covariance ?? [];

    expect(covariance(statistical(a), statistical(k))).toAgreeTo(matrix[1] ?? NaN, { digits: 10 });
    expect(standardUncertainty(statistical(k)) ** 2).toAgreeTo(matrix[3] ?? NaN, { digits: 10 });
  });
});

describe('straight line through the spring', () => {
  // By hand, in N and mm with u = 0.2 mm each: slope and intercept of fifteen points.
  const of = spring();
  const rows = of.trials.map(({ values }) => ({
    force: (Number(values['w']?.text) / 1000) * 9.81,
    length: Number(values['L']?.text) / 1000,
  }));
  const meanForce = rows.reduce((sum, { force }) => sum + force, 0) / rows.length;
  const spread = rows.reduce((sum, { force }) => sum + (force - meanForce) ** 2, 0);
  const slope = rows.reduce((sum, { force, length }) => sum + ((force - meanForce) / spread) * length, 0);

  test('stiffness is one over the slope, and its statistical u follows from the scatter of the abscissae', () => {
    const [stiffness] = fitOf(of).parameters;

    expect(stiffness?.value).toAgreeTo(1 / slope, { digits: 9 });
    expect(stiffness?.uFit).toAgreeTo(0.0002 / Math.sqrt(spread) / slope ** 2, { digits: 6 });
  });

  test('an error common to all lengths: moves the rest length by itself and the stiffness not at all', () => {
    expect(partOf(scalarOf(of, 'L0'), 'inst:ruler:offset')).toAgreeTo(0.0005, { digits: 9 });
    expect(Math.abs(partOf(scalarOf(of, 'D'), 'inst:ruler:offset'))).toBeLessThan(
      1e-9 * scalarOf(of, 'D').value,
    );
  });

  test('an error of g: moves the stiffness in proportion', () => {
    expect(partOf(scalarOf(of, 'D'), 'const:g:own')).toAgreeTo((scalarOf(of, 'D').value * 0.02) / 9.81, {
      digits: 8,
    });
  });

  test('the sentence: says what is free, how many trials count and what χ² is', () => {
    expect(fitOf(of).sentence).toMatch(
      /^With D and L_0 free, all 15 trials of series A give D = .* and L_0 = .*\smm; χ² is [\d.]+ for 13 degrees of freedom\.$/u,
    );
  });
});

describe('residuals of trials the model was fitted to', () => {
  test('their variance is um² − up² of the statistical part, and the shared ruler counts once', () => {
    const finding = fitOf(spring());

    for (const { measured, predicted, difference, fittedTo } of finding.points) {
      const random = measured.parts.find(({ source }) => source.startsWith('mean:'))?.c ?? NaN;
      const fit = standardUncertainty(
        predicted?.parts.filter(({ source }) => source.startsWith('fit:')) ?? [],
      );
      const rest = difference?.parts.filter(({ source }) => !source.startsWith('mean:')) ?? [];
      expect(fittedTo).toBe(true);
      expect((difference?.u ?? NaN) ** 2 - standardUncertainty(rest) ** 2).toAgreeTo(random ** 2 - fit ** 2, {
        digits: 9,
      });
      expect(
        Math.abs(difference?.parts.find(({ source }) => source === 'inst:ruler:offset')?.c ?? 0),
      ).toBeLessThan(1e-9);
    }
  });

  test('a second comparison with the same trials, nothing free: the residuals are the same', () => {
    const of = spring();
    const both = { ...of, comparisons: [...of.comparisons, comparison('c2', 'm1', ['A'], {})] };

    const [first, second] = [fitOf(both, 'c1'), fitOf(both, 'c2')];

    expect(second.points.every(({ fittedTo }) => fittedTo)).toBe(true);
    second.points.forEach(({ z }, i) => expect(z).toAgreeTo(first.points[i]?.z ?? NaN, { digits: 9 }));
  });
});

describe('choices of a comparison', () => {
  test('relative weights: the residuals set u, there is no p-value, and it is said', () => {
    const of = spring();
    const relative = {
      ...of,
      comparisons: of.comparisons.map((row) => ({ ...row, weights: 'relative' as const })),
    };
    const [absolute, scaled] = [fitOf(of), fitOf(relative)];

    const factor = Math.sqrt((absolute.chiSquared ?? NaN) / (absolute.degreesOfFreedom ?? NaN));

    expect(scaled.parameters[0]?.uFit).toAgreeTo((absolute.parameters[0]?.uFit ?? NaN) * factor, {
      digits: 9,
    });
    expect(scaled.pValue).toBeNull();
    expect(scaled.warnings[0]).toMatch(/^The weights are relative/u);
    expect(scalarOf(of, 'D').degreesOfFreedom).toBe(Infinity);
    expect(scalarOf(relative, 'D').degreesOfFreedom).toBeGreaterThanOrEqual(13);
    expect(scalarOf(relative, 'D').degreesOfFreedom).toBeLessThan(100);
  });

  test('relative weights with readings that carry no u: all weigh the same', () => {
    const of = spring();
    const bare = {
      ...of,
      quantities: of.quantities.map((row) => (row.id === 'L' ? recorded('L', 'mm') : row)),
      comparisons: of.comparisons.map((row) => ({ ...row, weights: 'relative' as const })),
    };

    expect(fitOf(bare).parameters[0]?.value).toAgreeTo(fitOf(of).parameters[0]?.value ?? NaN, { digits: 9 });
  });

  test('a bound in the way: the parameter stops there and a warning says so', () => {
    const of = spring();
    const bounded = {
      ...of,
      comparisons: of.comparisons.map((row) => ({
        ...row,
        free: row.free.map((free) => (free.quantity === 'D' ? { ...free, max: reading('45', 'N/m') } : free)),
      })),
    };

    const finding = fitOf(bounded);

    expect(finding.parameters[0]).toMatchObject({ value: 45, atBound: true });
    expect(
      finding.warnings.some((warning) =>
        /^D ended on its bound, 45\s?.*: the trials would take it further\.$/u.test(warning),
      ),
    ).toBe(true);
  });

  test('a range, one trial more and one excluded: only what is inside counts', () => {
    const of = spring();
    const trials = of.trials.map((row) =>
      row.id === 'A4'
        ? { ...row, excluded: { reason: 'slipped', by: 'Ines Farrow', at: '2026-03-01' } }
        : row,
    );
    const ranged = {
      ...of,
      trials,
      comparisons: of.comparisons.map((row) => ({
        ...row,
        selection: {
          ...row.selection,
          where: [{ quantity: 'w', min: reading('0.1', 'kg'), max: reading('200', 'g') }],
        },
      })),
    };

    const finding = fitOf(ranged);

    expect(finding.used).toEqual(['A5', 'A6', 'A7', 'A8', 'A9', 'A10', 'A11', 'A12']);
    expect(finding.outside).toEqual([{ trial: 'A4', why: 'excluded' }]);
  });

  test('a limit of the model: trials beyond it are shown, but do not count', () => {
    const of = spring();
    const limits = [{ quantity: 'w', min: null, max: reading('200', 'g') }];
    const limited = { ...of, models: of.models.map((row) => ({ ...row, limits })) };

    const finding = fitOf(limited);

    expect(finding.used).toHaveLength(12);
    expect(finding.outside.map(({ why }) => why)).toEqual([
      'outside trust',
      'outside trust',
      'outside trust',
    ]);
    expect(finding.points.map(({ trusted }) => trusted)).toEqual([true, true, true, true, false]);
    expect(finding.points[4]?.predicted?.warnings[0]).toMatch(
      /outside the range in which model 1 is trusted/u,
    );
  });

  test('a trial without its reading: counts as incomplete', () => {
    const of = spring();
    const trials = of.trials.map((row) => (row.id === 'A1' ? trial('A', 1, { w: reading('50', 'g') }) : row));

    expect(fitOf({ ...of, trials }).outside).toEqual([{ trial: 'A1', why: 'incomplete' }]);
  });

  test('a point that misses by far: leaks in the p-value, and the warning says so', () => {
    const of = spring();
    const trials = of.trials.map((row) =>
      row.id === 'A15' ? trial('A', 15, { w: reading('250', 'g'), L: reading('155', 'mm') }) : row,
    );

    const finding = fitOf({ ...of, trials });

    expect(finding.pValue).toBeLessThan(0.01);
    expect(
      finding.warnings.some((warning) =>
        /differ from the model by more than their uncertainties/u.test(warning),
      ),
    ).toBe(true);
  });
});

describe('predictions with nothing free', () => {
  /** Ten lengths read with one ruler, predicted exactly; each has 0.1 of its own. */
  function lengths(offset: string | null, miss: number): Evidence {
    return evidence({
      instruments: [ruler('ruler', '0.1', offset, 'mm')],
      quantities: [recorded('n', '1'), recorded('L', 'mm', 'ruler'), constant('d', reading('1', 'mm'))],
      series: [series('A', ['n'], ['L'])],
      trials: Array.from({ length: 10 }, (_, i) =>
        trial('A', i + 1, { n: reading(String(i + 1), '1'), L: reading(String(i + 1 + miss), 'mm') }),
      ),
      models: [model('m1', 1, 'L', [{ defines: 'L', expr: '{n}*{d}' }])],
      comparisons: [comparison('c1', 'm1', ['A'], {})],
    });
  }

  test('all miss alike by the ruler’s own doubt: χ² counts that once, not ten times', () => {
    // V = 0.01 + 0.25 everywhere: the common miss of 0.5 has 10·0.25/(0.01 + 10·0.25) = 0.996.
    expect(fitOf(lengths('0.5', 0.5)).chiSquared).toAgreeTo(2.5 / 2.51, { digits: 9 });
  });

  test('without a common error the same miss is ten misses', () => {
    expect(fitOf(lengths(null, 0.5)).chiSquared).toAgreeTo(250, { digits: 9 });
  });
});
