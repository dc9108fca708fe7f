import type { Express } from 'express';
import { answerLeak as answerLeakEndpoint, getLeaks as getLeaksEndpoint } from '#shared/contracts/leaks.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { answerLeak, getLeaks } from './service.ts';

export function mountLeaks(app: Express, deps: ServerDeps): void {
  mountProblem(app, deps.database, getLeaksEndpoint, 'read', ({ place }) => getLeaks(deps, place));

  mountProblem(app, deps.database, answerLeakEndpoint, 'write', async ({ place, actor, param, body }) => ({
    answer: await answerLeak(deps, place, actor, { leak: param('leak'), ...body }),
  }));
}
