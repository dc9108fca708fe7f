import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import { toShown, toStored } from '#shared/expressions/stored-form.ts';
import { symbols } from './problem-symbols.ts';

const known = symbols('θ', 'h', 'C_v', 'x');

describe('stored form', () => {
  test.each([
    ['C_v^2*h', '{q-C-v}^2*{q-h}'],
    ['2θ + 38°', '2{q-theta} + 38 [°]'],
    ['sin(theta)', 'sin({q-theta})'],
    ['2.5 mm*x', '2.5 [mm]*{q-x}'],
    ['5 m/s²', '5 [m/s^2]'],
    ['|x|', '|{q-x}|'],
    ['max(x, 2)', 'max({q-x}, 2)'],
  ])('%s: is kept as %s', (text, stored) => {
    expect(toStored(text, known)).toEqual({ ok: true, stored });
  });

  test('renaming a quantity: changes what is shown and nothing else', () => {
    const renamed = known.map((each) => (each.id === 'q-h' ? { ...each, symbol: 'H_0' } : each));

    expect(toShown('{q-C-v}^2*{q-h}', renamed)).toBe('C_v^2*H_0');
  });

  test('a symbol that becomes the name of a unit: gets a star before it', () => {
    const renamed = known.map((each) => (each.id === 'q-theta' ? { ...each, symbol: 'g' } : each));

    expect(toShown('2{q-theta} + 3 {q-theta}', renamed)).toBe('2*g + 3*g');
  });

  test('symbols that would run together: are kept apart', () => {
    expect(toShown('{q-x}{q-h}', known)).toBe('x h');
  });

  test('a new symbol that is also a unit: leaves stored numbers as they were meant', () => {
    const stored = '2 [m] + {q-x}';
    const more = [...known, { id: 'q-m', symbol: 'm' }];

    const result = parseExpression(stored, more);

    expect(result.ok && result.expression.inputs).toEqual(['q-x']);
  });

  test('a refused text: is not stored', () => {
    expect(toStored('2h', known).ok).toBe(false);
  });

  test('law: stored, shown and stored again is the same', () => {
    const atoms = fc.constantFrom('θ', 'x', 'C_v', '2', '3.5', '38°', '2 [cm]', 'pi');
    const operators = fc.constantFrom(' + ', ' - ', '*', ' · ');
    const chains = fc.tuple(atoms, fc.array(fc.tuple(operators, atoms), { maxLength: 6 }));

    fc.assert(
      fc.property(chains, ([first, rest]) => {
        const text = first + rest.map(([operator, atom]) => operator + atom).join('');
        const once = toStored(text, known);
        if (!once.ok) throw new Error(once.fault.sentence);

        expect(toStored(toShown(once.stored, known), known)).toEqual(once);
        expect(toStored(once.stored, known)).toEqual(once);
      }),
    );
  });
});
