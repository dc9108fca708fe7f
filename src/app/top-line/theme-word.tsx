import { themeChoice } from '#src/lib/preferences/theme.ts';
import { useTheme } from '#src/lib/preferences/use-theme.ts';

/** Dark or Light: the word says what a press brings. */
export function ThemeWord({ className }: { readonly className?: string }) {
  const other = useTheme() === 'dark' ? 'light' : 'dark';
  return (
    <button type="button" className={className} onClick={() => themeChoice.set(other)}>
      {other === 'dark' ? 'Dark' : 'Light'}
    </button>
  );
}
