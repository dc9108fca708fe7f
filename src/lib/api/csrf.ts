import { toApiError } from './api-error.ts';
import { getCsrfToken } from './boot-endpoints.ts';

let token: Promise<string> | null = null;

async function ask(): Promise<string> {
  const response = await fetch(getCsrfToken.path, { credentials: 'same-origin' });
  if (!response.ok) throw await toApiError(response);
  const body = (await response.json()) as { token: string };
  return body.token;
}

/** The token that every change carries; asked for once and kept until it is forgotten. */
export function csrfToken(): Promise<string> {
  token ??= ask().catch((error: unknown) => {
    token = null;
    throw error;
  });
  return token;
}

/** A token belongs to a session: forget it when somebody signs in or out, or when the server refuses it. */
export function forgetCsrfToken(): void {
  token = null;
}
