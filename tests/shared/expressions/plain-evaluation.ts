import type { ExpressionNode } from '#shared/expressions/expression.ts';

const FUNCTIONS: Readonly<Record<string, (...inputs: number[]) => number>> = {
  ...Object.fromEntries(
    (
      [
        'sqrt',
        'cbrt',
        'exp',
        'expm1',
        'log',
        'log1p',
        'log10',
        'log2',
        'sin',
        'cos',
        'tan',
        'asin',
        'acos',
        'atan',
      ] as const
    ).map((name) => [name, Math[name]]),
  ),
  ...Object.fromEntries(
    (
      [
        'sinh',
        'cosh',
        'tanh',
        'asinh',
        'acosh',
        'atanh',
        'abs',
        'sign',
        'min',
        'max',
        'hypot',
        'atan2',
      ] as const
    ).map((name) => [name, Math[name] as (...inputs: number[]) => number]),
  ),
};

/** One value of an expression, straight from its tree: nothing shared with the tape. */
export function evaluatePlainly(node: ExpressionNode, values: Readonly<Record<string, number>>): number {
  const of = (part: ExpressionNode): number => evaluatePlainly(part, values);
  switch (node.kind) {
    case 'number':
    case 'measure':
      return node.value;
    case 'pi':
      return Math.PI;
    case 'symbol':
      return values[node.id] ?? NaN;
    case 'negative':
      return -of(node.of);
    case 'binary': {
      const [a, b] = [of(node.left), of(node.right)];
      return { '+': a + b, '-': a - b, '*': a * b, '/': a / b, '^': a ** b }[node.operator];
    }
    case 'call':
      return FUNCTIONS[node.name]?.(...node.inputs.map(of)) ?? NaN;
    case 'comparison':
      return Number(
        node.operators.every((operator, i) => {
          const [a, b] = [of(node.terms[i] ?? node), of(node.terms[i + 1] ?? node)];
          return { '<': a < b, '<=': a <= b, '>': a > b, '>=': a >= b, '==': a === b, '!=': a !== b }[
            operator
          ];
        }),
      );
    case 'choice':
      return of(node.when) !== 0 ? of(node.then) : of(node.otherwise);
  }
}
