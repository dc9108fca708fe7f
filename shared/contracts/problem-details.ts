import { z } from 'zod';

/** The one error body of the API (RFC 9457, application/problem+json). `code` is stable; `detail` is for people. */
export const problemDetailsSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.string(),
  detail: z.string(),
  requestId: z.string(),
  /** Sentences beside the inputs they are about, by field path ("values.q-r.text"). */
  fields: z.record(z.string(), z.string()).optional(),
});
export type ProblemDetails = z.infer<typeof problemDetailsSchema>;
