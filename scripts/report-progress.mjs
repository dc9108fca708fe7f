/** Runs a command and says every few seconds that it is still at it, so that a long wait never looks like a stop. */
import { spawn } from 'node:child_process';

/**
 * @param {string} sentence what is being done, in words
 * @param {string} command
 * @param {string[]} args
 * @param {import('node:child_process').SpawnOptions & { quiet?: boolean }} [options] quiet keeps the output back unless it fails
 */
export function runWithProgress(sentence, command, args, options = {}) {
  const { quiet = false, ...rest } = options;
  const started = Date.now();
  console.log(`${sentence} …`);
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: quiet ? ['ignore', 'pipe', 'pipe'] : 'inherit', ...rest });
    let kept = '';
    child.stdout?.on('data', (chunk) => (kept += chunk));
    child.stderr?.on('data', (chunk) => (kept += chunk));
    const stillAtIt = setInterval(() => {
      console.log(`  still at it, ${Math.round((Date.now() - started) / 1000)} s so far`);
    }, 10_000);
    child.on('error', (cause) => {
      clearInterval(stillAtIt);
      reject(new Error(`${command} could not be started: ${cause.message}`));
    });
    child.on('exit', (code, signal) => {
      clearInterval(stillAtIt);
      if (code === 0) {
        console.log(`  done in ${((Date.now() - started) / 1000).toFixed(1)} s`);
        resolve(undefined);
        return;
      }
      if (kept) console.error(kept);
      reject(new Error(`${sentence}: ${command} ${args.join(' ')} ended with ${signal ?? `code ${code}`}`));
    });
  });
}
