import { createPreference } from './preference.ts';

export type Theme = 'light' | 'dark';

/** What the person chose; 'system' until they choose. */
export const themeChoice = createPreference<Theme | 'system'>('theme', ['light', 'dark', 'system'], 'system');

/** The theme that is shown now. */
export function shownTheme(): Theme {
  return document.documentElement.dataset['theme'] === 'dark' ? 'dark' : 'light';
}

/** Shows the chosen theme, and follows the system for as long as nothing was chosen. Charts read colours again on this event. */
export function applyTheme(): void {
  const choice = themeChoice.get();
  const system = matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light';
  document.documentElement.dataset['theme'] = choice === 'system' ? system : choice;
  window.dispatchEvent(new Event('themechange'));
}

export function followTheme(): void {
  applyTheme();
  themeChoice.subscribe(applyTheme);
  matchMedia('(prefers-color-scheme: dark)').addEventListener('change', applyTheme);
}
