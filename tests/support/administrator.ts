/** Who looks after the installation, made as on a first start. */
import { createSetupLink } from '#server/features/admin/service.ts';
import type { SignedIn, TestServer } from './server.ts';

const ADMINISTRATOR = {
  name: 'Halvard Quist',
  email: 'halvard.quist@harbour.example',
  passphrase: 'keys of the harbour office',
};

export async function setUpAdministrator(app: TestServer): Promise<void> {
  const link = await createSetupLink(app.server.deps);
  const stranger = await app.stranger();
  const answer = await stranger.post(`/api${new URL(link ?? '').pathname}`, ADMINISTRATOR);
  if (answer.status !== 200) throw new Error(`setUpAdministrator: answered ${answer.status} ${answer.text}`);
}

export function signInAdministrator(app: TestServer): Promise<SignedIn> {
  return app.signInWith(ADMINISTRATOR.email, ADMINISTRATOR.passphrase);
}
