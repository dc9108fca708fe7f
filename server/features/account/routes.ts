import type { Express } from 'express';
import {
  askForReset as askForResetEndpoint,
  resetPassphrase as resetPassphraseEndpoint,
} from '#shared/contracts/people.ts';
import { changePassphrase as changePassphraseEndpoint } from '#shared/contracts/session.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountOpen, mountSignedIn } from '#server/middleware/mount.ts';
import { passphraseLimits, resetLimits, tokenLimit } from '#server/middleware/rate-limits.ts';
import { askForReset, resetPassphrase } from './resets.ts';
import { changePassphrase } from './service.ts';

export function mountAccount(app: Express, deps: ServerDeps): void {
  mountSignedIn(app, changePassphraseEndpoint, ({ actor, body }) => changePassphrase(deps, actor, body), {
    before: passphraseLimits(deps.limits),
  });

  mountOpen(
    app,
    askForResetEndpoint,
    async ({ body }) => {
      // Beside the request: neither the answer nor its time tells whether anybody has this address.
      deps.mail.aside(() => askForReset(deps, body.email));
    },
    { before: resetLimits(deps.limits) },
  );

  mountOpen(
    app,
    resetPassphraseEndpoint,
    ({ body, param }) => resetPassphrase(deps, param('token'), body.passphrase),
    { before: [tokenLimit(deps.limits)] },
  );
}
