import { expect, test } from 'vitest';
import * as contracts from '#shared/contracts/session.ts';
import * as boot from '#src/lib/api/boot-endpoints.ts';

test.each([
  ['getSession', boot.getSession, contracts.getSession],
  ['signIn', boot.signIn, contracts.signIn],
  ['signOut', boot.signOut, contracts.signOut],
  ['getCsrfToken', boot.getCsrfToken, contracts.getCsrfToken],
  ['getHealth', boot.getHealth, contracts.getHealth],
  ['putPassphrase', boot.putPassphrase, contracts.changePassphrase],
])('boot endpoint %s, beside its contract: has the same method and path', (_, light, contract) => {
  expect({ method: light.method, path: light.path }).toEqual({
    method: contract.method,
    path: contract.path,
  });
});
