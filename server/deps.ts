import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import type { Environment } from './config/environment.ts';
import type { Database } from './database/database.ts';
import type { Evaluation } from './evaluation/evaluation.ts';
import type { EvidenceCache } from './features/evidence/service.ts';
import type { EventHub } from './features/events/service.ts';
import type { CopyPasses } from './features/copies/copy-passes.ts';
import type { SessionLayer } from './features/session/session-layer.ts';
import type { MailDelivery } from './mail/mail-delivery.ts';
import type { Csrf } from './middleware/csrf.ts';
import type { Limits } from './middleware/rate-limits.ts';
import type { ReportRenderer } from './rendering/report-renderer.ts';
import type { OpenSockets } from './sockets/open-sockets.ts';

/** Everything the server's features stand on, made once at the start and handed down. */
export interface ServerDeps {
  readonly environment: Environment;
  readonly database: Database;
  readonly logger: Logger;
  /** The only clock. */
  readonly now: () => Date;
  readonly session: SessionLayer;
  readonly csrf: Csrf;
  readonly copyPasses: CopyPasses;
  readonly limits: Limits;
  readonly mail: MailDelivery;
  /** Where people reach this server, for links in mail; never taken from a request, which anybody can forge. */
  readonly publicAddress: () => string;
  readonly sockets: OpenSockets;
  readonly events: EventHub;
  readonly evidenceCache: EvidenceCache;
  readonly evaluation: Evaluation;
  readonly renderer: ReportRenderer;
  /** Serves the client for every path outside /api; null where there is none (tests of the API). */
  readonly client: RequestHandler | null;
}
