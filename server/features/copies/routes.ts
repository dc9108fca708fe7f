import type { Express } from 'express';
import {
  changeCopy as changeCopyEndpoint,
  lendCopy as lendCopyEndpoint,
  listProblemCopies as listProblemCopiesEndpoint,
  listTeamCopies as listTeamCopiesEndpoint,
  previewCopy as previewCopyEndpoint,
} from '#shared/contracts/copies.ts';
import type { ServerDeps } from '#server/deps.ts';
import { notFound } from '#server/errors/refusals.ts';
import { mountProblem, mountTeam } from '#server/middleware/mount.ts';
import { tokenLimit } from '#server/middleware/rate-limits.ts';
import { mountCopyQuestions } from './question-routes.ts';
import { mountCopyReading } from './reader-routes.ts';
import { previewCopy } from './read-copy.ts';
import { changeCopy, lendCopy, listProblemCopies, listTeamCopies } from './service.ts';

export function mountCopies(app: Express, deps: ServerDeps): void {
  const { database } = deps;

  mountTeam(app, database, listTeamCopiesEndpoint, 'read', ({ place }) => listTeamCopies(deps, place));

  mountProblem(app, database, listProblemCopiesEndpoint, 'read', ({ place }) =>
    listProblemCopies(deps, place),
  );

  mountProblem(app, database, lendCopyEndpoint, 'captain', ({ place, actor, body, param }) => {
    if (!/^[1-9]\d{0,3}$/.test(param('n'))) throw notFound();
    return lendCopy(deps, place, actor, Number(param('n')), body);
  });

  mountProblem(app, database, changeCopyEndpoint, 'captain', ({ place, actor, body, param }) =>
    changeCopy(deps, place, actor, param('copy'), body),
  );

  mountProblem(app, database, previewCopyEndpoint, 'captain', ({ place, param }) =>
    previewCopy(deps, place, param('copy')),
  );

  const guarded = { before: [tokenLimit(deps.limits)] };
  mountCopyReading(app, deps, guarded);
  mountCopyQuestions(app, deps, guarded);
}
