/**
 * The few endpoints that the first load needs, without their schemas: these would bring the whole schema library
 * into the sign-in page. The types are those of the contracts, and a test holds the two together.
 */
import type {
  changePassphrase,
  getCsrfToken as csrfContract,
  getHealth as healthContract,
  getSession as sessionContract,
  signIn as signInContract,
  signOut as signOutContract,
} from '#shared/contracts/session.ts';

/** What the client needs to call an endpoint; `contract` exists for the compiler alone. */
export interface BootEndpoint<Contract> {
  readonly method: string;
  readonly path: string;
  readonly contract?: Contract;
}

export const getSession: BootEndpoint<typeof sessionContract> = { method: 'GET', path: '/api/session' };
export const signIn: BootEndpoint<typeof signInContract> = { method: 'POST', path: '/api/session' };
export const signOut: BootEndpoint<typeof signOutContract> = { method: 'DELETE', path: '/api/session' };
export const getCsrfToken: BootEndpoint<typeof csrfContract> = { method: 'GET', path: '/api/csrf' };
export const getHealth: BootEndpoint<typeof healthContract> = { method: 'GET', path: '/api/health' };
export const putPassphrase: BootEndpoint<typeof changePassphrase> = {
  method: 'PUT',
  path: '/api/account/password',
};
