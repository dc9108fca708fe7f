import type { Express } from 'express';
import type { ServerDeps } from '#server/deps.ts';
import {
  getCsrfToken,
  getSession as getSessionEndpoint,
  signIn,
  signOut,
} from '#shared/contracts/session.ts';
import { AppError } from '#server/errors/app-error.ts';
import { mountOpen, mountSignedIn } from '#server/middleware/mount.ts';
import { signInLimits } from '#server/middleware/rate-limits.ts';
import { getSession } from '#server/features/teams/service.ts';

export function mountSession(app: Express, deps: ServerDeps): void {
  mountSignedIn(app, getSessionEndpoint, ({ actor }) => getSession(deps.database, actor));

  mountOpen(app, getCsrfToken, async ({ request, response }) => ({
    token: deps.csrf.issue(request, response),
  }));

  mountOpen(
    app,
    signIn,
    async ({ request, response }) => {
      const user = await deps.session.checkCredentials(request, response);
      if (!user) {
        throw new AppError(401, 'wrong-credentials', 'This e-mail and passphrase do not fit together.');
      }
      await deps.session.logIn(request, user);
      return getSession(deps.database, user);
    },
    { before: signInLimits(deps.limits) },
  );

  mountSignedIn(app, signOut, async ({ actor, request, response }) => {
    await new Promise<void>((resolve, reject) => {
      request.session.destroy((error: unknown) => (error ? reject(error) : resolve()));
    });
    response.clearCookie('holdwater');
    deps.sockets.closeSession(actor.sessionId);
  });
}
