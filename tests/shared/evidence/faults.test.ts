/** Every kind of fault, with the sentence that says what to mend; what does not depend on it still computes. */
import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Fault, FaultCode } from '#shared/evidence/findings.ts';
import {
  comparison,
  constant,
  derived,
  evidence,
  instrument,
  model,
  quantity,
  reading,
  recorded,
  series,
  spring,
  trial,
} from './small-evidence.ts';

function faultOf(of: Evidence, key: string): Fault {
  const found = evaluate(of).values.get(key);
  if (found?.shape !== 'fault') throw new Error(`${key} is no fault but ${found?.shape ?? 'missing'}`);
  return found;
}

function quantities(...rows: Evidence['quantities']): Evidence {
  return evidence({ quantities: rows });
}

const summary = (stat: 'mean' | 'standard deviation' | 'slope', of = 'L', against?: string) =>
  quantity('q', stat === 'slope' ? 'mm/g' : 'mm', {
    origin: 'summary',
    of,
    ...(against === undefined ? {} : { against }),
    stat,
    where: { series: ['A'], plusTrials: [], where: [] },
    scatter: 'group',
  });

const cases: readonly (readonly [
  code: FaultCode,
  what: string,
  of: Evidence,
  key: string,
  sentence: RegExp,
  at: string,
])[] = [
  [
    'unknown unit',
    'a quantity in furlongs',
    quantities(constant('a', reading('1', 'm'), 'furlong')),
    'a',
    /^a: .*furlong/u,
    'a',
  ],
  [
    'unknown symbol',
    'an expression with a symbol that no quantity has',
    quantities(derived('a', 'm', '2*zeta')),
    'a',
    /^a: .*zeta|^a: .*ζ/u,
    'a',
  ],
  [
    'ambiguous text',
    'a number with both decimal marks, read as a constant',
    quantities(constant('a', reading('1,234.5', 'm'))),
    'a',
    /^a: .*decimal mark/u,
    'a',
  ],
  [
    'syntax',
    'an expression that stops in the middle',
    quantities(constant('b', reading('1', 'm')), derived('a', 'm', '2*({b}')),
    'a',
    /^a: /u,
    'a',
  ],
  [
    'dimension mismatch',
    'a length that is said to be an area',
    quantities(constant('b', reading('1', 'cm')), derived('a', 'cm', '{b}*{b}')),
    'a',
    /^a: Units do not agree/u,
    'a',
  ],
  [
    'cycle',
    'two quantities defined through one another',
    quantities(derived('a', 'm', '{b}'), derived('b', 'm', '{a}')),
    'a',
    /^a and b are defined through one another\. Change one of them\.$/u,
    'a',
  ],
  [
    'not measured',
    'a constant without a value',
    quantities(constant('a', null, 'm')),
    'a',
    /^a is named, but not measured\. Enter its value\.$/u,
    'a',
  ],
  [
    'no single value',
    'a column outside of all series',
    spring(),
    'L',
    /^L is read trial by trial\. Name a series and a setting\.$/u,
    'L',
  ],
  [
    'missing input',
    'a derived quantity whose input is not measured',
    quantities(constant('b', null, 'm'), derived('a', 'm', '2*{b}')),
    'a',
    /^b has to be mended first\. b is named, but not measured/u,
    'b',
  ],
  [
    'not a number',
    'a constant that is a word',
    quantities(constant('a', reading('often', 'm'))),
    'a',
    /^a: “often” is not a number/u,
    'a',
  ],
  [
    'not finite',
    'a division by zero',
    quantities(constant('b', reading('0', 'm')), derived('a', '1/m', '1/{b}')),
    'a',
    /^a does not come out as a finite number\. Look for a division by zero/u,
    'a',
  ],
  [
    'no trials',
    'a mean over a series without trials',
    { ...spring(), trials: [], quantities: [...spring().quantities, summary('mean')] },
    'q',
    /^q has no kept trial with L to be made from/u,
    'q',
  ],
  [
    'uncertainty not positive',
    'an uncertainty of zero',
    quantities(constant('a', reading('1', 'm', '0'))),
    'a',
    /^a: An uncertainty must be more than 0/u,
    'a',
  ],
  [
    'too few trials',
    'a standard deviation of one trial',
    {
      ...spring(),
      trials: spring().trials.slice(0, 1),
      quantities: [...spring().quantities, summary('standard deviation')],
    },
    'q',
    /^The standard deviation q needs at least 2 trials, and there is 1\.$/u,
    'q',
  ],
  [
    'constant input',
    'a slope against something that never changes',
    {
      ...spring(),
      trials: spring().trials.slice(0, 3),
      quantities: [...spring().quantities, summary('slope', 'L', 'w')],
    },
    'q',
    /^w is the same in all trials, so that there is no slope against it/u,
    'q',
  ],
  [
    'source gone',
    'an instrument that was removed',
    quantities(
      quantity('a', 'm', { origin: 'constant', reading: reading('1', 'm'), instrument: 'gone', parts: [] }),
    ),
    'a',
    /^The instrument of a is gone\. Choose another, or none\.$/u,
    'a',
  ],
];

describe('faults of quantities', () => {
  test.each(cases.filter(([code]) => code !== 'ambiguous text'))(
    '%s: %s',
    (code, _what, of, key, sentence, at) => {
      const found = faultOf(of, key);

      expect(found.code).toBe(code);
      expect(found.sentence).toMatch(sentence);
      expect(found.at).toBe(at);
    },
  );

  test('a number with both decimal marks: the sentence says how to write it', () => {
    const found = faultOf(quantities(constant('a', reading('1,234.5', 'm'))), 'a');

    expect(['not a number', 'ambiguous text']).toContain(found.code);
    expect(found.sentence).toMatch(/decimal mark/u);
  });

  test('ambiguous text: a symbol right behind a number that is also a unit', () => {
    const found = faultOf(
      quantities(constant('g', reading('9.8', 'm/s^2')), derived('a', 'm/s^2', '2 g')),
      'a',
    );

    expect(found.code).toBe('ambiguous text');
    expect(found.sentence).toMatch(/^a: /u);
  });

  test('one that is defined through itself: says so', () => {
    expect(faultOf(quantities(derived('a', 'm', '2*{a}')), 'a').sentence).toBe(
      'a is defined through itself. Change its definition.',
    );
  });

  test('a fault deep down: is passed on once, and points at the row to mend', () => {
    const of = quantities(constant('a', null, 'm'), derived('b', 'm', '2*{a}'), derived('c', 'm', '3*{b}'));

    const found = faultOf(of, 'c');

    expect(found).toMatchObject({ code: 'missing input', at: 'a', via: 'a' });
    expect(found.sentence).toBe('a has to be mended first. a is named, but not measured. Enter its value.');
  });

  test('a fault: leaves what does not depend on it alone', () => {
    const of = quantities(
      constant('a', null, 'm'),
      constant('b', reading('2', 'm')),
      derived('c', 'm', '3*{b}'),
    );

    expect(evaluate(of).values.get('c')).toMatchObject({ shape: 'scalar', value: 6 });
  });

  test('an instrument that states nothing, or in another kind of unit: is named', () => {
    const read = (amount: string, unit: string): Evidence =>
      evidence({
        instruments: [instrument('rule', [{ kind: 'stated', amount, unit, shape: 'normal', shared: false }])],
        quantities: [
          quantity('a', 'm', {
            origin: 'constant',
            reading: reading('1', 'm'),
            instrument: 'rule',
            parts: [],
          }),
        ],
      });

    expect(faultOf(read('-0.1', 'cm'), 'a')).toMatchObject({ code: 'uncertainty not positive', at: 'rule' });
    expect(faultOf(read('0.1', 's'), 'a')).toMatchObject({ code: 'dimension mismatch', at: 'rule' });
    expect(faultOf(read('much', 'cm'), 'a')).toMatchObject({ code: 'not a number', at: 'rule' });
  });
});

describe('faults in trials', () => {
  test('one reading that cannot be read: the trial is NaN, the sentence names it, the others stay', () => {
    const of = spring();
    const trials = of.trials.map((row) =>
      row.id === 'A2' ? trial('A', 2, { ...row.values, L: reading('long', 'mm') }) : row,
    );

    const found = evaluate({ ...of, trials }).values.get('L@A');

    expect(found).toMatchObject({
      shape: 'column',
      warnings: ['L of A2: “long” is not a number. Write figures such as 44.7.'],
    });
    expect(found?.shape === 'column' && [...found.values].filter(Number.isNaN)).toHaveLength(1);
  });

  test('a reading in seconds where a length is read: says in which unit it should be', () => {
    const of = spring();
    const trials = of.trials.map((row) => trial('A', row.number, { ...row.values, L: reading('1', 's') }));

    const found = faultOf({ ...of, trials }, 'L@A');

    expect(found.code).toBe('dimension mismatch');
    expect(found.sentence).toBe('L of A1 is given in s, but L is in mm. Give it in a unit of the same kind.');
  });

  test('a root of a negative number in one trial: that trial is left out and told', () => {
    const of = evidence({
      quantities: [recorded('x', 'm'), derived('r', 'm^(1/2)', 'sqrt({x})')],
      series: [series('A', [], ['x'])],
      trials: [trial('A', 1, { x: reading('4', 'm') }), trial('A', 2, { x: reading('-4', 'm') })],
    });

    const found = evaluate(of).values.get('r@A');

    expect(found).toMatchObject({ shape: 'column' });
    expect(found?.shape === 'column' && found.warnings[0]).toMatch(
      /^r of A2 does not come out as a finite number/u,
    );
  });
});

describe('faults of comparisons', () => {
  const fitFault = (of: Evidence): Fault | undefined => evaluate(of).comparisons.get('c1')?.fault;
  const cold = (free: Evidence['comparisons'][number]['free']): Evidence => ({
    ...spring(),
    comparisons: spring().comparisons.map((row) => ({ ...row, free })),
  });

  test('no trials at all: no trials', () => {
    expect(fitFault({ ...spring(), trials: [] })).toMatchObject({ code: 'no trials', at: 'c1' });
  });

  test('every trial excluded: says so', () => {
    const excluded = { reason: 'drift', by: 'Ines Farrow', at: '2026-03-01' };
    const of = { ...spring(), trials: spring().trials.map((row) => ({ ...row, excluded })) };

    expect(fitFault(of)?.sentence).toMatch(
      /Every selected trial is excluded\. Bring one back, or log another\.$/u,
    );
  });

  test('one trial for two parameters: too few trials', () => {
    const found = fitFault({ ...spring(), trials: spring().trials.slice(0, 1) });

    expect(found).toMatchObject({ code: 'too few trials', at: 'c1' });
    expect(found?.sentence).toBe('1 trial is not enough to find D and L_0. At least 2 are needed.');
  });

  test('one setting for two parameters: constant input', () => {
    expect(fitFault({ ...spring(), trials: spring().trials.slice(0, 3) })).toMatchObject({
      code: 'constant input',
    });
  });

  test('a parameter the model does not depend on: not determined', () => {
    const of = spring();
    const more = { ...of, quantities: [...of.quantities, constant('idle', reading('1', 'm'))] };
    const free = [
      ...(of.comparisons[0]?.free ?? []),
      { quantity: 'idle', start: reading('1', 'm'), min: null, max: null },
    ];

    const found = fitFault({ ...more, comparisons: more.comparisons.map((row) => ({ ...row, free })) });

    expect(found).toMatchObject({ code: 'not determined' });
    expect(found?.sentence).toMatch(/^idle is not determined by these trials\. Free fewer parameters/u);
  });

  test('readings without any uncertainty, absolute weights: uncertainty not positive, and what to do', () => {
    const of = spring();
    const found = fitFault({
      ...of,
      quantities: of.quantities.map((row) => (row.id === 'L' ? recorded('L', 'mm') : row)),
    });

    expect(found).toMatchObject({ code: 'uncertainty not positive', at: 'L' });
    expect(found?.sentence).toMatch(/Give L an instrument, or choose relative weights\.$/u);
  });

  test('a start at which the model is not finite: names the trial', () => {
    const found = fitFault(
      cold([
        { quantity: 'D', start: reading('0', 'N/m'), min: null, max: null },
        { quantity: 'L0', start: reading('90', 'mm'), min: null, max: null },
      ]),
    );

    expect(found).toMatchObject({ code: 'not finite', at: 'c1' });
    expect(found?.sentence).toMatch(/for A1 at the start value of D and L_0/u);
  });

  test('a search that cannot end: not converged', () => {
    const of = evidence({
      instruments: [],
      quantities: [
        recorded('x', '1'),
        recorded('v', '1'),
        quantity('a', '1', { origin: 'fitted', comparison: 'c1' }),
      ],
      series: [series('A', ['x'], ['v'])],
      trials: [1, 2, 3, 4].map((i) =>
        trial('A', i, { x: reading(String(i), '1'), v: reading('0', '1', '0.1') }),
      ),
      models: [model('m1', 1, 'v', [{ defines: 'v', expr: 'exp(-{a}*{x})' }])],
      comparisons: [comparison('c1', 'm1', ['A'], { a: reading('1', '1') })],
    });

    const found = evaluate(of).comparisons.get('c1');

    expect(
      found?.status === 'fault' && ['not converged', 'not determined'].includes(found.fault?.code ?? ''),
    ).toBe(true);
  });

  test('a fit that fails: what was measured is still shown, in the comparison and in its chart', () => {
    const of = spring();
    const bare = {
      ...of,
      quantities: of.quantities.map((row) => (row.id === 'L' ? recorded('L', 'mm') : row)),
    };

    const findings = evaluate(bare);

    expect(findings.comparisons.get('c1')?.points).toHaveLength(5);
    expect(findings.charts.get('ch1')).toMatchObject({
      fault: { code: 'uncertainty not positive' },
      y: 'L',
      curve: null,
    });
    expect(
      findings.charts.get('ch1')?.points.every(({ predicted, z }) => predicted === null && z === null),
    ).toBe(true);
  });

  test('an axis that has no value at the compared settings: says so', () => {
    const of = { ...spring(), quantities: [...spring().quantities, recorded('T', 'K')] };

    expect(
      evaluate({ ...of, charts: of.charts.map((row) => ({ ...row, x: 'T' })) }).charts.get('ch1')?.sentence,
    ).toBe('T has no value at the compared settings, so that it cannot be the axis. Choose another.');
  });

  test('a model that was removed: source gone, and what hangs on it says so too', () => {
    const findings = evaluate({ ...spring(), models: [] });

    expect(findings.comparisons.get('c1')?.fault).toMatchObject({ code: 'source gone', at: 'c1' });
    expect(findings.values.get('D')).toMatchObject({ shape: 'fault', at: 'c1' });
    expect(findings.charts.get('ch1')?.fault?.code).toBe('source gone');
    expect(findings.claims.get('cl1')).toMatchObject({ verdict: 'Undecided', short: 'cannot be tested yet' });
  });

  test('bounds the wrong way round, or a start outside: refused', () => {
    const bounded = (start: string, min: string, max: string) =>
      cold([
        { quantity: 'D', start: reading(start, 'N/m'), min: reading(min, 'N/m'), max: reading(max, 'N/m') },
        { quantity: 'L0', start: reading('90', 'mm'), min: null, max: null },
      ]);

    expect(fitFault(bounded('40', '50', '30'))?.sentence).toMatch(
      /lower bound of D .* is not below the upper one/u,
    );
    expect(fitFault(bounded('60', '30', '50'))?.sentence).toMatch(
      /start of D .* lies outside of its bounds/u,
    );
  });
});

describe('references to what is gone', () => {
  test.each([
    { kind: 'quantity', quantity: 'x' },
    { kind: 'mean', quantity: 'L', series: 'Z', at: {} },
    { kind: 'prediction', model: 'm9', quantity: 'L', series: 'A', at: {} },
    { kind: 'reading', trial: 'A99', quantity: 'L' },
    { kind: 'fit', comparison: 'c9', figure: 'chi-squared' },
    { kind: 'claim', claim: 'cl9', figure: 'z' },
    { kind: 'count', of: 'used', comparison: 'c9' },
    { kind: 'count', of: 'kept', series: 'Z' },
  ] as const)('$kind: source gone', (ref) => {
    const of = spring();

    expect(findValue(evaluate(of), of, ref)).toMatchObject({ shape: 'fault', code: 'source gone' });
  });
});
