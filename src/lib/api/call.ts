import type { AnswerOf, BodyOf, Endpoint } from '#shared/contracts/endpoint.ts';
import { askToSignInAgain } from '#src/lib/session/sign-in-again.ts';
import { addressOf } from './address-of.ts';
import { ApiError, toApiError } from './api-error.ts';
import type { BootEndpoint } from './boot-endpoints.ts';
import { csrfToken, forgetCsrfToken } from './csrf.ts';

type Callable = Endpoint | BootEndpoint<unknown>;
type ContractOf<E> = E extends Endpoint ? E : E extends BootEndpoint<infer C> ? C : never;
export type Answer<E> = AnswerOf<ContractOf<E>>;
type BodyOption<E> =
  BodyOf<ContractOf<E>> extends undefined
    ? { readonly body?: FormData | undefined }
    : { readonly body: BodyOf<ContractOf<E>> };

export type CallOptions<E> = BodyOption<E> & {
  readonly params?: Readonly<Record<string, string | number>> | undefined;
  /** The row's version that this change was made on. */
  readonly ifMatch?: number | undefined;
  readonly signal?: AbortSignal | undefined;
  /** A session that has ended is an answer like any other: do not ask to sign in again. */
  readonly mayBeSignedOut?: boolean | undefined;
};

/**
 * Calls an endpoint and gives its answer; throws ApiError. The server has checked the answer against the same
 * contract, so it is not checked again here. Where the session has ended, the person signs in again in place and
 * the call is made once more, so nothing that was typed is lost.
 */
export async function call<const E extends Callable>(
  endpoint: E,
  options: CallOptions<E>,
): Promise<Answer<E>> {
  let response = await send(endpoint, options);
  if (response.status === 403 && (await hasCode(response, /^csrf/))) {
    forgetCsrfToken();
    response = await send(endpoint, options);
  }
  if (response.status === 401 && options.mayBeSignedOut !== true && (await askToSignInAgain())) {
    response = await send(endpoint, options);
  }
  if (!response.ok) throw await toApiError(response);
  if (response.status === 204) return undefined as Answer<E>;
  return (await response.json()) as Answer<E>;
}

interface SendOptions {
  readonly body?: unknown;
  readonly params?: Readonly<Record<string, string | number>> | undefined;
  readonly ifMatch?: number | undefined;
  readonly signal?: AbortSignal | undefined;
}

async function send(endpoint: Callable, options: SendOptions): Promise<Response> {
  const headers = new Headers({ accept: 'application/json, application/problem+json' });
  const { body } = options;
  if (body !== undefined && !(body instanceof FormData)) headers.set('content-type', 'application/json');
  if (options.ifMatch !== undefined) headers.set('if-match', `"${options.ifMatch}"`);
  const address = addressOf(endpoint.path, options.params);
  try {
    if (endpoint.method !== 'GET') headers.set('x-csrf-token', await csrfToken());
    return await fetch(address, {
      method: endpoint.method,
      headers,
      credentials: 'same-origin',
      body: body === undefined ? null : body instanceof FormData ? body : JSON.stringify(body),
      signal: options.signal ?? null,
    });
  } catch (error) {
    if (error instanceof ApiError || isAbort(error)) throw error;
    throw ApiError.notReached(error);
  }
}

async function hasCode(response: Response, pattern: RegExp): Promise<boolean> {
  return pattern.test((await toApiError(response.clone())).code);
}

function isAbort(error: unknown): boolean {
  return error instanceof DOMException && error.name === 'AbortError';
}
