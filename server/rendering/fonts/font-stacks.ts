import type { FontName } from './font-files.ts';

/** Faces tried in turn for each character of a text. STIX Two Text has no ∂ √ ∞ ≈ ≤ ≥ ∑ ∫; KaTeX's faces do. */
export const FONT_STACKS = {
  body: ['stix', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  bodyItalic: ['stixItalic', 'stix', 'Main-Italic', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  bodyMedium: ['stixMedium', 'stix', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  bodyMediumItalic: ['stixMediumItalic', 'stixMedium', 'Main-Italic', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  bodyBold: ['stixSemiBold', 'stix', 'Main-Bold', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  bodyBoldItalic: ['stixSemiBoldItalic', 'stixSemiBold', 'Main-BoldItalic', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  ui: ['hanken', 'stix', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  uiMedium: ['hankenMedium', 'stixMedium', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
  uiBold: ['hankenSemiBold', 'stixSemiBold', 'Main-Regular', 'AMS-Regular', 'Size1-Regular'],
} as const satisfies Record<string, readonly FontName[]>;

export type FontStack = keyof typeof FONT_STACKS;
