/** `npm test`: installs what is missing, then runs every check. */
import { ensureInstalled } from './install.mjs';

try {
  await ensureInstalled();
  const { validate } = await import('./validate.mjs');
  await validate();
  console.log('\nEverything passes.');
} catch (cause) {
  console.error(`\n${cause.message}`);
  process.exitCode = 1;
}
