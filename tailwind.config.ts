import type { Config } from 'tailwindcss';

/**
 * Names by meaning and by use, mapped to the tokens of src/styles/tokens.css. The theme's own scale (ink, paper,
 * water, the type sizes) stands there; here is what a component should say when it speaks of data.
 */
const config: Config = {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    extend: {
      colors: {
        measured: 'var(--color-water)',
        'measured-wash': 'var(--color-water-wash)',
        predicted: 'var(--color-copper)',
        'predicted-wash': 'var(--color-copper-wash)',
        difference: 'var(--color-leak)',
        'difference-wash': 'var(--color-leak-wash)',
        level: 'var(--color-water-fill)',
      },
      fontFamily: {
        ui: 'var(--font-ui)',
        report: 'var(--font-report)',
        code: 'var(--font-code)',
      },
      boxShadow: {
        page: 'var(--shadow-page)',
        card: 'var(--shadow-card)',
      },
      maxWidth: {
        report: 'var(--width-report)',
        season: 'var(--width-season)',
        measure: 'var(--width-measure)',
      },
      transitionTimingFunction: {
        settle: 'var(--ease-settle)',
      },
    },
  },
};

export default config;
