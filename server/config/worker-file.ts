import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

export interface WorkerFile {
  readonly filename: string;
  readonly execArgv: string[];
}

/**
 * Where a worker thread's code lies: the TypeScript file beside the caller while developing and testing, or its
 * bundle below the bundled server (dist/server/index.js).
 *
 * @param caller - import.meta.url of the caller
 * @param source - the worker's file from the folder `server`, e.g. 'evaluation/evaluation-worker.ts'
 */
export function workerFile(caller: string, source: string): WorkerFile {
  const name = source.split('/').at(-1) ?? source;
  const typescript = fileURLToPath(new URL(name, caller));
  if (existsSync(typescript)) return { filename: typescript, execArgv: ['--import', 'tsx'] };
  return { filename: fileURLToPath(new URL(source.replace(/\.ts$/, '.js'), caller)), execArgv: [] };
}
