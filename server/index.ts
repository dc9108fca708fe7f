/** The program: reads the environment, starts, says where, and stops when told to. */
import { parseEnvironment } from './config/environment.ts';
import { createLogger } from './config/logger.ts';
import { startFailure } from './config/start-failure.ts';
import { startServer } from './start-server.ts';
import type { RunningServer } from './start-server.ts';

const FORCED_EXIT_MS = 8_000;

async function start(): Promise<void> {
  const environment = parseEnvironment(process.env);
  const logger = createLogger(environment.logLevel);
  const running = await startServer({ environment, logger, now: () => new Date() });
  logger.info({ url: running.url, data: environment.dataFolder, mode: environment.mode }, 'listening');
  stopOnSignals(running);
  if (running.setupLink !== null) {
    // On the terminal of who started it and nowhere else: this is no line of the log.
    process.stdout.write(
      `\nNobody looks after this installation yet. Open this once, within 24 hours, to set it up:\n`,
    );
    process.stdout.write(`  ${running.setupLink}\n`);
  }
  // Whoever started us waits for this: over its channel, or as one line when there is none.
  if (process.send) process.send({ ready: running.url });
  else process.stdout.write(`ready ${running.url}\n`);
}

function stopOnSignals({ close, deps: { logger } }: RunningServer): void {
  let isStopping = false;
  const stop = (signal: string) => {
    if (isStopping) return;
    isStopping = true;
    logger.info({ signal }, 'stopping');
    setTimeout(() => process.exit(1), FORCED_EXIT_MS).unref();
    close().then(
      () => process.exit(0),
      (error: unknown) => {
        logger.error({ err: error }, 'did not stop cleanly');
        process.exit(1);
      },
    );
  };
  for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP']) process.on(signal, stop);
}

start().catch((error: unknown) => {
  process.stderr.write(`${startFailure(error)}\n`);
  process.exit(1);
});
