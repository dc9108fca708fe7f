import {
  addRational,
  divideRational,
  multiplyRational,
  powerRational,
  subtractRational,
  type Rational,
} from '#shared/numeric/rational.ts';
import type { BinaryOperator, ExpressionNode } from './expression.ts';

/** Powers beyond this are no fraction worth keeping exactly. */
const MAX_POWER = 100n;

/**
 * The exact value of a part that is made of pure numbers alone, such as `1/3` or `-0.5`; null for anything else.
 *
 * @example exactConstant({ kind: 'number', text: '0.5', value: 0.5, exact: { n: 1n, d: 2n }, span: { from: 0, to: 3 } }) // => { n: 1n, d: 2n }
 */
export function exactConstant(node: ExpressionNode): Rational | null {
  switch (node.kind) {
    case 'number':
      return node.exact;
    case 'negative': {
      const of = exactConstant(node.of);
      return of === null ? null : { n: -of.n, d: of.d };
    }
    case 'binary': {
      const left = exactConstant(node.left);
      const right = left === null ? null : exactConstant(node.right);
      return left === null || right === null ? null : combined(node.operator, left, right);
    }
    default:
      return null;
  }
}

function combined(operator: BinaryOperator, left: Rational, right: Rational): Rational | null {
  switch (operator) {
    case '+':
      return addRational(left, right);
    case '-':
      return subtractRational(left, right);
    case '*':
      return multiplyRational(left, right);
    case '/':
      return right.n === 0n ? null : divideRational(left, right);
    case '^': {
      const small = right.d === 1n && right.n <= MAX_POWER && right.n >= -MAX_POWER;
      return small && left.n !== 0n ? powerRational(left, Number(right.n)) : null;
    }
  }
}
