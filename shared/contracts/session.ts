/** Signing in and out, and one's own account. Anybody may call these; rate limited. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';

export const roleSchema = z.enum(['captain', 'member', 'advisor']);
export type Role = z.infer<typeof roleSchema>;

export const sessionSchema = z.object({
  user: z.object({
    id: z.string(),
    name: z.string(),
    email: z.string(),
    /** Looks after the installation and reads no problem; left out for everybody else. */
    isAdministrator: z.literal(true).optional(),
  }),
  teams: z.array(z.object({ slug: z.string(), name: z.string(), university: z.string(), role: roleSchema })),
});
export type Session = z.infer<typeof sessionSchema>;

export const MIN_PASSPHRASE_LENGTH = 12;

/** Who is signed in; 401 `not-signed-in` otherwise. */
export const getSession = endpoint({
  method: 'GET',
  path: '/api/session',
  body: null,
  status: 200,
  answer: sessionSchema,
});

/** Signs in; 401 `wrong-credentials`, 429 `too-many-attempts`. */
export const signIn = endpoint({
  method: 'POST',
  path: '/api/session',
  body: z.object({
    email: z.email('Write the whole address, like ines.farrow@skerry.example.'),
    passphrase: z.string().min(1, 'Write your passphrase.').max(200),
  }),
  status: 200,
  answer: sessionSchema,
});

export const signOut = endpoint({
  method: 'DELETE',
  path: '/api/session',
  body: null,
  status: 204,
  answer: null,
});

/** A token for the header `x-csrf-token` of every change; ask again after signing in. */
export const getCsrfToken = endpoint({
  method: 'GET',
  path: '/api/csrf',
  body: null,
  status: 200,
  answer: z.object({ token: z.string() }),
});

/** Changes the passphrase and signs every other session of this person out; 422 `wrong-passphrase`. */
export const changePassphrase = endpoint({
  method: 'PUT',
  path: '/api/account/password',
  body: z.object({
    current: z.string().min(1, 'Write the passphrase you use now.').max(200),
    next: z
      .string()
      .min(
        MIN_PASSPHRASE_LENGTH,
        `Use at least ${MIN_PASSPHRASE_LENGTH} characters; four unrelated words do well.`,
      )
      .max(200),
  }),
  status: 204,
  answer: null,
});

/** Whether the installation shows its invented demonstration, and with which sign-ins. */
export const getHealth = endpoint({
  method: 'GET',
  path: '/api/health',
  body: null,
  status: 200,
  answer: z.object({
    ok: z.literal(true),
    version: z.string(),
    /** Schema version of report documents that this server writes. */
    reportSchema: z.number().int(),
    demo: z
      .array(z.object({ name: z.string(), email: z.string(), passphrase: z.string(), role: roleSchema }))
      .nullable(),
    /** A lent copy of the demonstration, which anybody may read; null when there is none, or its time is over. */
    demoCopy: z.object({ token: z.string(), recipient: z.string(), title: z.string() }).nullable(),
  }),
});
