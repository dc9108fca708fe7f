import { followTheme } from '#src/lib/preferences/theme.ts';
import { adoptStyleNonce } from '#src/lib/style-nonce.ts';

adoptStyleNonce();

// The theme stands before anything is drawn; the rest of the page is another, larger file.
followTheme();
void import('./app/mount.tsx').then(({ mount }) => mount());
