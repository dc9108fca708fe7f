import { followTheme } from '#src/lib/preferences/theme.ts';

// The theme stands before anything is drawn; the rest of the page is another, larger file.
followTheme();
void import('./app/mount.tsx').then(({ mount }) => mount());
