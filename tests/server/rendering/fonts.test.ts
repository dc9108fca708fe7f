import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { FONT_FILES, fontsFolder } from '#server/rendering/fonts/font-files.ts';
import { FONT_STACKS, type FontStack } from '#server/rendering/fonts/font-stacks.ts';
import { loadFace } from '#server/rendering/fonts/load-face.ts';
import { shapeText } from '#server/rendering/fonts/shape-text.ts';

const STACKS = Object.keys(FONT_STACKS) as FontStack[];

describe('faces of the PDF', () => {
  test.each(Object.values(FONT_FILES))('%s, when the project is fetched: lies beside its licence', (file) => {
    const path = join(fontsFolder(), file);

    const licence = readFileSync(join(dirname(path), 'OFL.txt'), 'utf8');

    expect(existsSync(path)).toBe(true);
    expect(licence).toContain('SIL OPEN FONT LICENSE Version 1.1');
  });

  test('folder of faces, when it is looked for: is the project’s own, not that of a package', () => {
    expect(fontsFolder()).not.toContain('node_modules');
  });

  test('files in the folder, when compared with the list: none is there that is not used', () => {
    const used = new Set<string>(Object.values(FONT_FILES));

    const unused = readdirSync(fontsFolder(), { recursive: true, encoding: 'utf8' }).filter(
      (file) => file.endsWith('.ttf') && !used.has(file),
    );

    expect(unused).toEqual([]);
  });

  test.each(STACKS)('stack %s, when it sets what physicists write: has every sign', (stack) => {
    const signs = [...'∂√∞≈≤≥∈∑∫θσχΔΩμ°′−±·×½→–—“”…²³⁻¹₀₁\u2009\u202f'];

    const missing = signs.filter((sign) =>
      shapeText(stack, sign).runs.some((run) => run.glyphs.some((glyph) => glyph.id === 0)),
    );

    expect(missing).toEqual([]);
  });
});

describe('shapeText', () => {
  test('raised figures, when shaped: are ordinary figures, smaller and lifted', () => {
    const { runs } = shapeText('body', 's⁻²');

    expect(runs.map((run) => [run.scale < 1, run.rise > 0])).toEqual([
      [false, false],
      [true, true],
    ]);
    expect(runs[1]?.glyphs.map((glyph) => glyph.codePoints)).toEqual([[0x2212], [0x32]]);
  });

  test('a glyph that others are built from, when it is set after them: still carries its own character', () => {
    shapeText('ui', ': ; ! ?');

    const dot = loadFace('hanken').glyph('.'.codePointAt(0) ?? 0);

    expect(dot.codePoints).toEqual([0x2e]);
  });

  test('width, when a text is set in one face: is the sum of its advances with kerning', () => {
    const { font } = loadFace('stix');
    const units = font.layout('AVATAR').positions.reduce((sum, position) => sum + position.xAdvance, 0);

    expect(shapeText('body', 'AVATAR').width).toAgreeTo(units / font.unitsPerEm, { digits: 12 });
  });
});
