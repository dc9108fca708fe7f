export { createSetupLink } from './setup.ts';
