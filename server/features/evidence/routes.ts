import type { Express } from 'express';
import {
  definitions,
  getEvidence as getEvidenceEndpoint,
  getFindings as getFindingsEndpoint,
} from '#shared/contracts/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getIfMatch } from '#server/middleware/if-match.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { createDefinition, removeDefinition, replaceDefinition } from './definitions.ts';
import { findingsToJson } from '#shared/evidence/findings-json.ts';
import { DEFINITION_TABLES } from './model.ts';
import { getEvidence } from './service.ts';

export function mountEvidence(app: Express, deps: ServerDeps): void {
  mountProblem(app, deps.database, getEvidenceEndpoint, 'read', async ({ place, response }) => {
    const stored = await getEvidence(deps, place.problem.id);
    response.set('etag', `"${stored.evidence.version}"`).set('cache-control', 'private, no-cache');
    return stored;
  });
  mountProblem(app, deps.database, getFindingsEndpoint, 'read', async ({ place }) => {
    const { evidence } = await getEvidence(deps, place.problem.id);
    return findingsToJson(await deps.evaluation.getFindings(place.problem.id, evidence));
  });
  for (const table of DEFINITION_TABLES) mountDefinitions(app, deps, table);
}

function mountDefinitions(app: Express, deps: ServerDeps, table: DefinitionTable): void {
  const { create, replace, remove } = definitions[table];

  mountProblem(app, deps.database, create, 'write', ({ place, actor, body }) =>
    createDefinition(deps, place, actor, { table, mutationId: body.mutationId, body: body.row }),
  );

  mountProblem(app, deps.database, replace, 'write', ({ place, actor, body, param, request }) =>
    replaceDefinition(
      deps,
      place,
      actor,
      { table, mutationId: body.mutationId, body: body.row },
      { id: param('id'), ifMatch: getIfMatch(request) },
    ),
  );

  mountProblem(app, deps.database, remove, 'write', ({ place, actor, body, param }) =>
    removeDefinition(deps, place, actor, { table, mutationId: body.mutationId, id: param('id') }),
  );
}
