import type { Token } from './tokens.ts';

/**
 * What stands between a function's name and its bracket: nothing, or a power as in sin²(θ) and sin^2(θ).
 *
 * @param at - index of the name
 * @returns the power, and the index where the bracket should be
 * @example callHead([], 0) // => { open: 1, power: 1, isOpen: false }
 */
export function callHead(
  tokens: readonly Token[],
  at: number,
): { readonly open: number; readonly power: number; readonly isOpen: boolean } {
  const [first, second] = tokens.slice(at + 1, at + 3);
  let open = at + 1;
  let power = 1;
  if (first?.kind === 'raised') {
    power = first.power;
    open += 1;
  } else if (isSign(first, '^') && second?.kind === 'number' && /^\d$/u.test(second.text)) {
    power = Number(second.text);
    open += 2;
  }
  return { open, power, isOpen: isSign(tokens[open], '(') };
}

function isSign(token: Token | undefined, text: string): boolean {
  return token?.kind === 'sign' && token.text === text;
}
