import type { Express } from 'express';
import { changePassphrase as changePassphraseEndpoint } from '#shared/contracts/session.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountSignedIn } from '#server/middleware/mount.ts';
import { passphraseLimits } from '#server/middleware/rate-limits.ts';
import { changePassphrase } from './service.ts';

export function mountAccount(app: Express, deps: ServerDeps): void {
  mountSignedIn(app, changePassphraseEndpoint, ({ actor, body }) => changePassphrase(deps, actor, body), {
    before: passphraseLimits(deps.limits),
  });
}
