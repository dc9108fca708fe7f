/** Runs a long-lived child: its output is ours, our signals are its own, its end is ours. */
import { spawn } from 'node:child_process';

/**
 * @param {string[]} args arguments of node
 * @param {import('node:child_process').SpawnOptions} options
 * @param {(message: unknown) => void} [onMessage] what the child tells over its channel
 */
export function runChild(args, options, onMessage) {
  const child = spawn(process.execPath, args, {
    stdio: ['inherit', 'inherit', 'inherit', 'ipc'],
    ...options,
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => child.kill(signal));
  }
  if (onMessage) child.on('message', onMessage);
  child.on('exit', (code, signal) => process.exit(signal ? 1 : (code ?? 1)));
  return child;
}
