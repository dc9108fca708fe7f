import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Every face of the PDF, by the file it lies in below the folder `fonts`. */
export const FONT_FILES = {
  stix: 'stix-two-text/STIXTwoText_400Regular.ttf',
  stixItalic: 'stix-two-text/STIXTwoText_400Regular_Italic.ttf',
  stixMedium: 'stix-two-text/STIXTwoText_500Medium.ttf',
  stixMediumItalic: 'stix-two-text/STIXTwoText_500Medium_Italic.ttf',
  stixSemiBold: 'stix-two-text/STIXTwoText_600SemiBold.ttf',
  stixSemiBoldItalic: 'stix-two-text/STIXTwoText_600SemiBold_Italic.ttf',
  hanken: 'hanken-grotesk/HankenGrotesk_400Regular.ttf',
  hankenMedium: 'hanken-grotesk/HankenGrotesk_500Medium.ttf',
  hankenSemiBold: 'hanken-grotesk/HankenGrotesk_600SemiBold.ttf',
  'AMS-Regular': 'katex/KaTeX_AMS-Regular.ttf',
  'Caligraphic-Bold': 'katex/KaTeX_Caligraphic-Bold.ttf',
  'Caligraphic-Regular': 'katex/KaTeX_Caligraphic-Regular.ttf',
  'Fraktur-Bold': 'katex/KaTeX_Fraktur-Bold.ttf',
  'Fraktur-Regular': 'katex/KaTeX_Fraktur-Regular.ttf',
  'Main-Bold': 'katex/KaTeX_Main-Bold.ttf',
  'Main-BoldItalic': 'katex/KaTeX_Main-BoldItalic.ttf',
  'Main-Italic': 'katex/KaTeX_Main-Italic.ttf',
  'Main-Regular': 'katex/KaTeX_Main-Regular.ttf',
  'Math-BoldItalic': 'katex/KaTeX_Math-BoldItalic.ttf',
  'Math-Italic': 'katex/KaTeX_Math-Italic.ttf',
  'SansSerif-Bold': 'katex/KaTeX_SansSerif-Bold.ttf',
  'SansSerif-Italic': 'katex/KaTeX_SansSerif-Italic.ttf',
  'SansSerif-Regular': 'katex/KaTeX_SansSerif-Regular.ttf',
  'Script-Regular': 'katex/KaTeX_Script-Regular.ttf',
  'Size1-Regular': 'katex/KaTeX_Size1-Regular.ttf',
  'Size2-Regular': 'katex/KaTeX_Size2-Regular.ttf',
  'Size3-Regular': 'katex/KaTeX_Size3-Regular.ttf',
  'Size4-Regular': 'katex/KaTeX_Size4-Regular.ttf',
  'Typewriter-Regular': 'katex/KaTeX_Typewriter-Regular.ttf',
} as const;

export type FontName = keyof typeof FONT_FILES;

/** The project's folder `fonts`: above this file in the sources, and above the bundle in production. */
export function fontsFolder(): string {
  let folder = dirname(fileURLToPath(import.meta.url));
  for (;;) {
    const fonts = join(folder, 'fonts');
    if (existsSync(join(fonts, FONT_FILES.stix))) return fonts;
    const above = dirname(folder);
    if (above === folder) throw new Error(`fontsFolder: found no folder with ${FONT_FILES.stix}`);
    folder = above;
  }
}
