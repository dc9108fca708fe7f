/**
 * How an endpoint of the contracts becomes a route. There is no other way to add one: each says who may call it, and
 * has its body parsed by its own schema before the handler sees it.
 */
import type { Express, Request, RequestHandler, Response } from 'express';
import type { z } from 'zod';
import type { AnswerOf, BodyOf, Endpoint } from '#shared/contracts/endpoint.ts';
import type { Database } from '#server/database/database.ts';
import { notAllowed, notFound, notSignedIn } from '#server/errors/refusals.ts';
import { isAdministrator } from '#server/features/account/service.ts';
import { findProblemPlace, findTeamPlace } from '#server/features/teams/service.ts';
import type { ProblemPlace, TeamPlace } from '#server/features/teams/service.ts';
import type { Actor } from './actor.ts';
import { parseBody } from './parse-body.ts';

type AnyEndpoint = Endpoint<z.ZodType | null, z.ZodType | null>;

/** What a handler is given, besides its place. */
export interface Call<E extends AnyEndpoint> {
  readonly body: BodyOf<E>;
  readonly request: Request;
  readonly response: Response;
  /** A named part of the path. */
  readonly param: (name: string) => string;
}

/** Read: everybody of the team. Write: captain and members. Advise: advisors alone. */
export type Right = 'read' | 'write' | 'advise' | 'captain';

type Answer<E extends AnyEndpoint> = Promise<AnswerOf<E> | (undefined extends AnswerOf<E> ? void : never)>;

export interface MountOptions {
  /** Run after the right was checked and before the body is parsed: an upload, a rate limit. */
  readonly before?: readonly RequestHandler[];
}

/** A route that anybody may call, signed in or not. */
export function mountOpen<E extends AnyEndpoint>(
  app: Express,
  endpoint: E,
  handler: (call: Call<E>) => Answer<E>,
  options: MountOptions = {},
): void {
  register(app, endpoint, () => Promise.resolve(null), handler, options);
}

/** A route for everybody who is signed in; 401 otherwise. */
export function mountSignedIn<E extends AnyEndpoint>(
  app: Express,
  endpoint: E,
  handler: (call: Call<E> & { readonly actor: Actor }) => Answer<E>,
  options: MountOptions = {},
): void {
  const enter = (request: Request) => Promise.resolve({ actor: getActor(request) });
  register(app, endpoint, enter, handler, options);
}

/** A route of who looks after the installation; for everybody else there is none: 404. */
export function mountAdministrator<E extends AnyEndpoint>(
  app: Express,
  database: Database,
  endpoint: E,
  handler: (call: Call<E> & { readonly actor: Actor }) => Answer<E>,
): void {
  const enter = async (request: Request) => {
    const actor = getActor(request);
    if (!(await isAdministrator(database, actor.id))) throw notFound();
    return { actor };
  };
  register(app, endpoint, enter, handler, {});
}

/** A route of one team: 404 for who is not in it, 403 for who is but may not. */
export function mountTeam<E extends AnyEndpoint>(
  app: Express,
  database: Database,
  endpoint: E,
  right: Right,
  handler: (call: Call<E> & { readonly actor: Actor; readonly place: TeamPlace }) => Answer<E>,
  options: MountOptions = {},
): void {
  const enter = async (request: Request) => {
    const actor = getActor(request);
    const place = await findTeamPlace(database, actor.id, String(request.params.team));
    return { actor, place: assertRight(place, right) };
  };
  register(app, endpoint, enter, handler, options);
}

/** A route of one problem: 404 for who is not in its team, 403 for who is but may not. */
export function mountProblem<E extends AnyEndpoint>(
  app: Express,
  database: Database,
  endpoint: E,
  right: Right,
  handler: (call: Call<E> & { readonly actor: Actor; readonly place: ProblemPlace }) => Answer<E>,
  options: MountOptions = {},
): void {
  const enter = async (request: Request) => {
    const actor = getActor(request);
    const { team, number } = request.params;
    if (!/^[1-9]\d{0,2}$/.test(String(number))) throw notFound();
    const place = await findProblemPlace(database, actor.id, String(team), Number(number));
    return { actor, place: assertRight(place, right) };
  };
  register(app, endpoint, enter, handler, options);
}

function getActor(request: Request): Actor {
  if (!request.user) throw notSignedIn();
  const { id, name, email } = request.user;
  return { id, name, email, sessionId: request.sessionID };
}

function assertRight<P extends TeamPlace>(place: P | null, right: Right): P {
  if (!place) throw notFound();
  if (right === 'write' && place.role === 'advisor') {
    throw notAllowed('Advisors read and advise; the captain and the members make changes.');
  }
  if (right === 'advise' && place.role !== 'advisor') {
    throw notAllowed('Only an advisor may do this.');
  }
  if (right === 'captain' && place.role !== 'captain') {
    throw notAllowed('Only the captain may do this.');
  }
  return place;
}

function register<E extends AnyEndpoint, Entered extends object>(
  app: Express,
  endpoint: E,
  enter: (request: Request) => Promise<Entered | null>,
  handler: (call: Call<E> & Entered) => Answer<E>,
  { before = [] }: MountOptions,
): void {
  const entered = new WeakMap<Request, Entered | null>();
  const check: RequestHandler = async (request, _response, next) => {
    entered.set(request, await enter(request));
    next();
  };
  const answer: RequestHandler = async (request, response) => {
    const call = {
      ...entered.get(request),
      body: parseBody(endpoint.body, request.body) as BodyOf<E>,
      request,
      response,
      param: (name: string) => String(request.params[name]),
    } as Call<E> & Entered;
    const result = await handler(call);
    if (response.headersSent || response.writableEnded) return;
    response.status(endpoint.status);
    if (result === undefined || result === null) response.end();
    else response.json(result);
  };
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  app[method](endpoint.path, check, ...before, answer);
}
