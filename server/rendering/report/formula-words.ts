/** What a reader who cannot see a formula is told: its LaTeX without what only sets it. */
export function formulaWords(latex: string): string {
  return latex
    .replace(/\\htmlClass\{(?:fm|fp)\}/gu, '')
    .replace(/\\(?:mathrm|text|mathit|left|right)(?![a-zA-Z])/gu, '')
    .replace(/\\[,;:! ]/gu, ' ')
    .replace(/\{([\p{L}\p{N}.]+)\}/gu, '$1')
    .replace(/\s+/gu, ' ')
    .trim();
}
