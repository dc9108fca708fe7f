import express from 'express';
import type { Express } from 'express';
import type { ServerDeps } from './deps.ts';
import { notFound } from './errors/refusals.ts';
import { problemJson } from './errors/problem-json.ts';
import { mountAccount } from './features/account/routes.ts';
import { mountAdmin } from './features/admin/routes.ts';
import { mountCopies } from './features/copies/routes.ts';
import { mountEditions } from './features/editions/routes.ts';
import { mountEvidence } from './features/evidence/routes.ts';
import { mountExports } from './features/exports/routes.ts';
import { mountFights } from './features/fights/routes.ts';
import { mountFiles } from './features/files/routes.ts';
import { mountHealth } from './features/health/routes.ts';
import { mountInvitations } from './features/invitations/routes.ts';
import { mountLeaks } from './features/leaks/routes.ts';
import { mountNotes } from './features/notes/routes.ts';
import { mountProblems } from './features/problems/routes.ts';
import { mountReport } from './features/report/routes.ts';
import { mountSession } from './features/session/routes.ts';
import { mountTeams } from './features/teams/routes.ts';
import { mountTrials } from './features/trials/routes.ts';
import { readCookies } from './middleware/read-cookies.ts';
import { requestId } from './middleware/request-id.ts';
import { requestLog } from './middleware/request-log.ts';
import { securityHeaders } from './middleware/security-headers.ts';

const MAX_JSON = '2mb';

/** The whole HTTP side as one Express app. Starts nothing: no port, no thread, no timer. */
export function createApp(deps: ServerDeps): Express {
  const app = express();
  app.disable('x-powered-by');
  app.use(requestId, requestLog(deps.logger), ...securityHeaders(deps.environment.mode));
  app.use(
    '/api',
    noStore,
    readCookies,
    ...deps.session.handlers,
    deps.csrf.protect,
    express.json({ limit: MAX_JSON }),
  );

  mountHealth(app, deps);
  mountSession(app, deps);
  mountAccount(app, deps);
  mountAdmin(app, deps);
  mountTeams(app, deps);
  mountInvitations(app, deps);
  mountFights(app, deps);
  mountProblems(app, deps);
  mountEvidence(app, deps);
  mountTrials(app, deps);
  mountReport(app, deps);
  mountFiles(app, deps);
  mountExports(app, deps);
  mountEditions(app, deps);
  mountCopies(app, deps);
  mountLeaks(app, deps);
  mountNotes(app, deps);

  app.use('/api', () => {
    throw notFound();
  });
  if (deps.client) app.use(deps.client);
  app.use(() => {
    throw notFound();
  });
  app.use(problemJson(deps.logger));
  return app;
}

/** What belongs to a team stays out of every cache, unless its route says otherwise. */
const noStore: express.RequestHandler = (_request, response, next) => {
  response.setHeader('cache-control', 'no-store');
  next();
};
