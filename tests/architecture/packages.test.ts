/** Every package that the product says it stands on is really used, and nothing is installed for nothing. */
import { describe, expect, test } from 'vitest';
import { importsOf, readSource, sourceFiles } from '#tests/support/source-files.ts';

const imported = new Set(
  [
    ...sourceFiles('src', 'server', 'shared', 'tests'),
    'vite.config.ts',
    'tailwind.config.ts',
    'eslint.config.js',
  ]
    .flatMap(importsOf)
    .map((name) =>
      name.startsWith('@') ? name.split('/').slice(0, 2).join('/') : (name.split('/')[0] ?? name),
    ),
);
const styles = readSource('src/styles/index.css');

describe('packages', () => {
  test.each([
    'react',
    'react-dom',
    'react-router-dom',
    '@tanstack/react-query',
    '@tanstack/react-table',
    '@tanstack/react-virtual',
    'react-hook-form',
    'zod',
    'radix-ui',
    'vite',
    'express',
    'sequelize',
    'sqlite3',
    'passport',
    'passport-local',
    'multer',
    '@tiptap/react',
    '@tiptap/starter-kit',
    'katex',
    'chart.js',
    'react-chartjs-2',
    'pdfkit',
    'vitest',
    'supertest',
  ])('%s is imported', (name) => {
    const known = imported.has(name) || (name === 'vite' && imported.has('vitest'));
    expect(known).toBe(true);
  });

  test('tailwindcss draws the styles, from a configuration that maps names to the tokens', () => {
    expect(styles).toMatch(/@import ['"]tailwindcss['"]/);
    expect(styles).toMatch(/@config ['"].*tailwind\.config\.ts['"]/);
    expect(readSource('tailwind.config.ts')).toContain('var(--color-');
  });
});
