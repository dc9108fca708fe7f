import type { z } from 'zod';

/** One endpoint of the HTTP API. `path` is Express's; `:team` and `:number` are ids in the address. */
export interface Endpoint<
  Body extends z.ZodType | null = z.ZodType | null,
  Answer extends z.ZodType | null = z.ZodType | null,
> {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  readonly path: string;
  /** Schema of the request body; null: none. */
  readonly body: Body;
  /** Status of success and the schema of its body; null: no body. */
  readonly status: 200 | 201 | 204;
  readonly answer: Answer;
}

/** Keeps the exact schema types of an endpoint's definition. */
export function endpoint<Body extends z.ZodType | null, Answer extends z.ZodType | null>(
  definition: Endpoint<Body, Answer>,
): Endpoint<Body, Answer> {
  return definition;
}

export type BodyOf<E> =
  E extends Endpoint<infer B, infer _A> ? (B extends z.ZodType ? z.infer<B> : undefined) : never;
export type AnswerOf<E> =
  E extends Endpoint<infer _B, infer A> ? (A extends z.ZodType ? z.infer<A> : undefined) : never;

/** Address of a problem; every endpoint under it is answered with 404 for who may not read it. */
export const PROBLEM_PATH = '/api/teams/:team/problems/:number';
