import type { Express } from 'express';
import {
  compareEditions as compareEditionsEndpoint,
  freezeEdition as freezeEditionEndpoint,
  getEdition as getEditionEndpoint,
  getEditionPdf as getEditionPdfEndpoint,
  listEditions as listEditionsEndpoint,
} from '#shared/contracts/editions.ts';
import type { ServerDeps } from '#server/deps.ts';
import { notFound } from '#server/errors/refusals.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { sendPdf } from '#server/middleware/send-pdf.ts';
import { compareWith } from './compare.ts';
import { freezeEdition, getEdition, getEditionPdf, listEditions } from './service.ts';

export function mountEditions(app: Express, deps: ServerDeps): void {
  const { database } = deps;

  mountProblem(app, database, listEditionsEndpoint, 'read', ({ place }) =>
    listEditions(database, place.problem.id),
  );

  mountProblem(app, database, freezeEditionEndpoint, 'captain', ({ place, actor, body }) =>
    freezeEdition(deps, place, actor, body),
  );

  mountProblem(app, database, getEditionEndpoint, 'read', async ({ place, param }) => {
    const { edition, content } = await getEdition(database, place.problem.id, numberIn(param('n')));
    return { edition, content };
  });

  mountProblem(app, database, getEditionPdfEndpoint, 'read', async ({ place, param, request, response }) => {
    const file = await getEditionPdf(deps, place, numberIn(param('n')));
    sendPdf(response, file, 'show' in request.query ? 'inline' : 'attachment');
  });

  mountProblem(app, database, compareEditionsEndpoint, 'read', ({ place, param }) => {
    const other = param('other');
    return compareWith(deps, place, numberIn(param('n')), other === 'draft' ? other : numberIn(other));
  });
}

/** The number of an edition as an address has it; 404 for what is none. */
function numberIn(text: string): number {
  if (!/^[1-9]\d{0,3}$/.test(text)) throw notFound();
  return Number(text);
}
