import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { create, type Font, type Glyph } from 'fontkit';
import { FONT_FILES, fontsFolder, type FontName } from './font-files.ts';

/** A parsed face with what is asked of it again and again. */
export interface Face {
  readonly name: FontName;
  readonly font: Font;
  /** Whether it has a glyph of its own for a code point. */
  has(codePoint: number): boolean;
  glyph(codePoint: number): Glyph;
}

const faces = new Map<FontName, Face>();

/** A face, parsed once in this thread. */
export function loadFace(name: FontName): Face {
  const known = faces.get(name);
  if (known) return known;
  const font = openFont(name);
  prewarm(font);
  const coverage = new Set(font.characterSet);
  const glyphs = new Map<number, Glyph>();
  const face: Face = {
    name,
    font,
    has: (codePoint) => coverage.has(codePoint),
    glyph(codePoint) {
      const cached = glyphs.get(codePoint);
      if (cached) return cached;
      const glyph = font.glyphForCodePoint(codePoint);
      glyphs.set(codePoint, glyph);
      return glyph;
    },
  };
  faces.set(name, face);
  return face;
}

function openFont(name: FontName): Font {
  const font = create(readFileSync(join(fontsFolder(), FONT_FILES[name])));
  if (!('characterSet' in font)) throw new TypeError(`loadFace: needs one face a file, got a collection in ${name}`);
  return font;
}

/**
 * fontkit keeps one glyph object for each glyph, with the code points of whoever asked for it first; a composite asks
 * for its components with none, and text set with such a component could later not be read out of a PDF. So every
 * code point is asked for once, before anything else.
 */
function prewarm(font: Font): void {
  for (const codePoint of [...font.characterSet].sort((a, b) => a - b)) font.glyphForCodePoint(codePoint);
}
