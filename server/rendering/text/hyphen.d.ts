/** The part of hyphen 1.14.1 that the PDF uses. */
declare module 'hyphen' {
  export default function createHyphenator(
    patterns: unknown,
    options: { readonly hyphenChar: string; readonly minWordLength: number },
  ): (text: string) => string;
}

declare module 'hyphen/patterns/en-gb.js' {
  const patterns: unknown;
  export default patterns;
}
