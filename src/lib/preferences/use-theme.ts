import { useSyncExternalStore } from 'react';
import { shownTheme, type Theme } from './theme.ts';

function subscribe(listener: () => void): () => void {
  window.addEventListener('themechange', listener);
  return () => window.removeEventListener('themechange', listener);
}

/** The theme that is shown now; renders again when it changes. */
export function useTheme(): Theme {
  return useSyncExternalStore(subscribe, shownTheme);
}
