import type { Express } from 'express';
import {
  createProblem as createProblemEndpoint,
  getProblem as getProblemEndpoint,
  listProblems as listProblemsEndpoint,
  updateProblem as updateProblemEndpoint,
} from '#shared/contracts/teams.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getIfMatch } from '#server/middleware/if-match.ts';
import { mountProblem, mountTeam } from '#server/middleware/mount.ts';
import { createProblem, getProblem, updateProblem } from './service.ts';
import { listProblems } from './list-problems.ts';

export function mountProblems(app: Express, deps: ServerDeps): void {
  mountTeam(app, deps.database, listProblemsEndpoint, 'read', ({ place }) => listProblems(deps, place));

  mountTeam(app, deps.database, createProblemEndpoint, 'write', ({ place, actor, body }) =>
    createProblem(deps, place, actor, body),
  );

  mountProblem(app, deps.database, getProblemEndpoint, 'read', ({ place }) => getProblem(deps, place));

  mountProblem(app, deps.database, updateProblemEndpoint, 'write', ({ place, actor, body, request }) =>
    updateProblem(deps, place, actor, getIfMatch(request), body),
  );
}
