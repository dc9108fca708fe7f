import { describe, expect, test } from 'vitest';
import { compileTape } from '#shared/expressions/compile-tape.ts';
import { expression, symbols } from './problem-symbols.ts';

/** Height of a throw with quadratic drag; values and derivatives recomputed to 15 figures from the formula. */
const THROW = {
  text: '(2*m*g/(rho*C*pi*r^2))/(2*g)*log(1+v^2*rho*C*pi*r^2/(2*m*g))',
  inputs: { m: 0.0027, g: 9.81, rho: 1.2, C: 0.45, r: 0.02, v: 12 },
  value: 4.159610602872575,
  derivatives: {
    m: 584.9929198145084,
    g: -0.26301016507374,
    rho: -1.31623406958264,
    C: -3.50995751888705,
    r: -157.948088349917,
    v: 0.430021619895567,
  },
} as const;
const known = symbols('m', 'g', 'ρ', 'C', 'r', 'v', 'x', 'y');
const idOf = (symbol: string) =>
  known.find((row) => row.symbol === (symbol === 'rho' ? 'ρ' : symbol))?.id ?? '';

describe('compile tape', () => {
  test('the throw with drag: value and all six derivatives to 12 digits', () => {
    const names = Object.keys(THROW.inputs) as (keyof typeof THROW.inputs)[];
    const tape = compileTape(expression(THROW.text, known), names.map(idOf));

    const [value] = tape.run(
      names.map((name) => THROW.inputs[name]),
      1,
    );
    const gradient = tape.gradient();

    expect(value).toAgreeTo(THROW.value, { digits: 12 });
    names.forEach((name, index) =>
      expect(gradient[index]?.[0]).toAgreeTo(THROW.derivatives[name], { digits: 12 }),
    );
  });

  test('a column and a number: each row by itself', () => {
    const tape = compileTape(expression('x^2*y', known), [idOf('x'), idOf('y')]);

    const values = [...tape.run([Float64Array.of(1, 2, 3), 10], 3)];
    const [byX, byY] = tape.gradient();

    expect(values).toEqual([10, 40, 90]);
    expect([...(byX ?? [])]).toEqual([20, 40, 60]);
    expect([...(byY ?? [])]).toEqual([1, 4, 9]);
  });

  test.each([
    ['x < y ? x : y', [2, 3], 2, [1, 0]],
    ['max(x, y)', [2, 3], 3, [0, 1]],
    ['abs(x)*y', [-2, 3], 6, [-3, 2]],
    ['atan2(x, y)', [1, 1], Math.PI / 4, [0.5, -0.5]],
    ['x^y', [2, 3], 8, [12, 8 * Math.log(2)]],
    ['sqrt(x) + cbrt(y)', [4, 8], 4, [0.25, 1 / 12]],
  ] as const)('%s: value and slopes', (text, [x, y], value, slopes) => {
    const tape = compileTape(expression(text, known), [idOf('x'), idOf('y')]);

    expect(tape.run([x, y], 1)[0]).toAgreeTo(value, { digits: 14 });
    tape
      .gradient()
      .forEach((column, index) => expect(column[0]).toAgreeTo(slopes[index] ?? NaN, { digits: 14 }));
  });

  test('run a second time with other lengths: no trace of the first', () => {
    const tape = compileTape(expression('x*y', known), [idOf('x'), idOf('y')]);
    tape.run([Float64Array.of(1, 2, 3), Float64Array.of(4, 5, 6)], 3);

    expect([...tape.run([7, 8], 1)]).toEqual([56]);
  });
});
