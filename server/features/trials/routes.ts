import type { Express } from 'express';
import {
  changeTrial as changeTrialEndpoint,
  logTrials as logTrialsEndpoint,
} from '#shared/contracts/evidence.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { changeTrial, logTrials } from './service.ts';

export function mountTrials(app: Express, deps: ServerDeps): void {
  mountProblem(app, deps.database, logTrialsEndpoint, 'write', ({ place, actor, body, param }) =>
    logTrials(deps, place, actor, { series: param('series'), ...body }),
  );

  mountProblem(app, deps.database, changeTrialEndpoint, 'write', ({ place, actor, body, param }) =>
    changeTrial(deps, place, actor, param('trial'), body),
  );
}
