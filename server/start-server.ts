import { createServer } from 'node:http';
import type { Server } from 'node:http';
import { mkdir } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import type { Express } from 'express';
import type { Logger } from 'pino';
import { createApp } from './app.ts';
import { attachCollaboration } from './collaboration/attach-collaboration.ts';
import type { Collaboration } from './collaboration/attach-collaboration.ts';
import { serveBuiltClient, serveLiveClient } from './client.ts';
import type { ServedClient } from './client.ts';
import type { Environment } from './config/environment.ts';
import { getSessionSecret } from './config/session-secret.ts';
import { databaseFile } from './database/database-file.ts';
import { openDatabase } from './database/database.ts';
import type { Database } from './database/database.ts';
import { createMigrator } from './database/migrator.ts';
import { seedDemo } from './database/seeders/demo/seed-demo.ts';
import type { ServerDeps } from './deps.ts';
import { createEvaluation } from './evaluation/evaluation.ts';
import { createCopyPasses } from './features/copies/copy-passes.ts';
import { attachEventStream } from './features/events/event-stream.ts';
import { EventHub } from './features/events/service.ts';
import { createEvidenceCache } from './features/evidence/service.ts';
import { createSetupLink } from './features/admin/service.ts';
import { createSessionLayer } from './features/session/session-layer.ts';
import { clearExpiredSessions } from './features/session/service.ts';
import { MailDelivery } from './mail/mail-delivery.ts';
import { createMailTransport } from './mail/transport.ts';
import type { MailTransport } from './mail/transport.ts';
import { createCsrf } from './middleware/csrf.ts';
import { DEFAULT_LIMITS } from './middleware/rate-limits.ts';
import type { Limits } from './middleware/rate-limits.ts';
import { createReportRenderer } from './rendering/report-renderer.ts';
import { OpenSockets } from './sockets/open-sockets.ts';
import { attachSocketUpgrades } from './sockets/socket-upgrades.ts';

export interface ServerOptions {
  readonly environment: Environment;
  readonly logger: Logger;
  readonly now: () => Date;
  readonly limits?: Limits;
  /** Takes the mail; without it, the one that the environment names. */
  readonly mailTransport?: MailTransport;
}

export interface RunningServer {
  readonly url: string;
  readonly app: Express;
  readonly deps: ServerDeps;
  /** Opens the set-up once, while nobody looks after the installation and there is no demonstration; null otherwise. */
  readonly setupLink: string | null;
  /** Tells open tabs that it restarts, finishes what is under way, and closes everything. */
  close(): Promise<void>;
}

/** Opens the data folder, brings the database up to date, loads the demonstration once, and listens. */
export async function startServer(options: ServerOptions): Promise<RunningServer> {
  const { environment } = options;
  await mkdir(environment.dataFolder, { recursive: true });
  const server = createServer();
  const client = await createClient(environment, server);
  const address = { url: '' };
  const deps = await createDeps(options, client, () => environment.publicUrl ?? address.url);
  const app = createApp(deps);
  server.on('request', app);
  const upgrades = attachSocketUpgrades(server, { ...deps, findActor: deps.session.findActor });
  attachEventStream(upgrades, deps);
  const collaboration = attachCollaboration(upgrades, deps);
  const port = await listen(server, environment);
  address.url = `http://${environment.host.includes(':') ? `[${environment.host}]` : environment.host}:${port}`;
  const clearing = setInterval(() => clearSessions(deps), HOUR_MS);
  const delivering = setInterval(() => void deps.mail.wake(), MAIL_EVERY_MS);
  void deps.mail.wake();
  return {
    url: address.url,
    setupLink: environment.demo ? null : await createSetupLink(deps),
    app,
    deps,
    close: () => {
      clearInterval(clearing);
      clearInterval(delivering);
      return closeAll(server, client, collaboration, deps);
    },
  };
}

const HOUR_MS = 3_600_000;
const MAIL_EVERY_MS = 20_000;

function clearSessions({ database, now, logger }: ServerDeps): void {
  clearExpiredSessions(database, now()).catch((error: unknown) => {
    logger.error({ err: error }, 'expired sessions were not cleared');
  });
}

async function createDeps(
  options: ServerOptions,
  client: ServedClient | null,
  publicAddress: () => string,
): Promise<ServerDeps> {
  const { environment, logger, now, limits } = options;
  const secret = await getSessionSecret(environment.dataFolder);
  const database = openDatabase(databaseFile(environment.dataFolder));
  await createMigrator(database).up();
  if (environment.demo) await seedDemo(database, now());
  await clearExpiredSessions(database, now());
  const events = new EventHub();
  return {
    environment,
    database,
    logger,
    now,
    session: createSessionLayer(database, secret, now),
    csrf: createCsrf(secret),
    copyPasses: createCopyPasses(secret, now),
    limits: limits ?? DEFAULT_LIMITS,
    sockets: new OpenSockets(),
    mail: createMail(options, database, events),
    publicAddress,
    events,
    evidenceCache: createEvidenceCache(),
    evaluation: createEvaluation(logger),
    renderer: createReportRenderer(logger),
    client: client?.handler ?? null,
  };
}

function createMail(
  { environment, logger, now, mailTransport }: ServerOptions,
  database: Database,
  events: EventHub,
): MailDelivery {
  const { smtpUrl, dataFolder, mailFrom } = environment;
  const transport = mailTransport ?? createMailTransport({ smtpUrl, dataFolder, from: mailFrom });
  const onChange = async (teamId: string) => {
    const team = await database.models.teams.findByPk(teamId, { attributes: ['slug'], raw: true });
    if (team) events.publishStale({ team: { id: teamId, slug: team.slug }, role: 'captain' }, 'outbox');
  };
  return new MailDelivery({ database, transport, logger, now, onChange });
}

async function createClient(environment: Environment, server: Server): Promise<ServedClient | null> {
  switch (environment.mode) {
    case 'production':
      return serveBuiltClient(path.resolve('dist/client'));
    case 'development':
      return serveLiveClient(server);
    case 'test':
      return null;
  }
}

function listen(server: Server, { host, port }: Environment): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve((server.address() as AddressInfo).port);
    });
  });
}

const GRACE_MS = 1_000;

async function closeAll(
  server: Server,
  client: ServedClient | null,
  collaboration: Collaboration,
  deps: ServerDeps,
): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  deps.sockets.closeAll();
  server.closeIdleConnections();
  const impatience = setTimeout(() => {
    deps.sockets.terminateAll();
    server.closeAllConnections();
  }, GRACE_MS);
  await closed;
  clearTimeout(impatience);
  await client?.close();
  await collaboration.close();
  await deps.mail.close();
  await deps.evaluation.close();
  await deps.renderer.close();
  await deps.database.close();
}
