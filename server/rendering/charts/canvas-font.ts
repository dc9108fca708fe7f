import type { FontStack } from '../fonts/font-stacks.ts';

/** A canvas font as the PDF sets it. */
export interface CanvasFont {
  readonly size: number;
  readonly stack: FontStack;
}

const fonts = new Map<string, CanvasFont>();

/** Reads a CSS font such as `italic 400 14px "STIX Two Text"`; a serif family is the report's, any other the interface's. */
export function canvasFont(css: string): CanvasFont {
  const known = fonts.get(css);
  if (known) return known;
  const size = Number(/([\d.]+)px/u.exec(css)?.[1] ?? 12);
  const isBold = /\b(?:bold|[6-9]00)\b/u.test(css);
  const isItalic = /\bitalic\b/u.test(css);
  const isReport = /stix/iu.test(css);
  const stack = isReport
    ? isItalic
      ? 'bodyItalic'
      : isBold
        ? 'bodyBold'
        : 'body'
    : isBold
      ? 'uiBold'
      : 'ui';
  const font: CanvasFont = { size, stack };
  fonts.set(css, font);
  return font;
}
