import { fileURLToPath } from 'node:url';

/** The project's top folder. */
export const ROOT = fileURLToPath(new URL('..', import.meta.url));
