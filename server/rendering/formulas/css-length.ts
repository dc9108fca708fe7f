const CSS_PIXELS_PER_EM = 16;

/** A length of KaTeX's inline styles in ems of the formula: `em` is the node's own em, `px` a sixteenth of one. */
export function cssLength(text: string | undefined, em: number): number {
  if (text === undefined) return 0;
  const value = Number.parseFloat(text);
  if (Number.isNaN(value)) return 0;
  return text.endsWith('px') ? value / CSS_PIXELS_PER_EM : value * em;
}
