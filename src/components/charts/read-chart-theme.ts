import type { ChartTheme } from '#shared/report/charts/chart-theme.ts';

/** Colours and faces as the page has them now. */
export function readChartTheme(): ChartTheme {
  const style = getComputedStyle(document.documentElement);
  const read = (name: string) => style.getPropertyValue(name).trim();
  return {
    ink: read('--color-ink'),
    ink2: read('--color-ink-2'),
    ink3: read('--color-ink-3'),
    paper: read('--color-paper'),
    hair: read('--color-hair'),
    water: read('--color-water'),
    copper: read('--color-copper'),
    leak: read('--color-leak'),
    uiFace: read('--font-ui'),
    reportFace: read('--font-report'),
  };
}
