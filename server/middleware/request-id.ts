import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type {} from './request-types.ts';

/** Gives each request an id of our own; one sent by the client is not believed. */
export const requestId: RequestHandler = (request, response, next) => {
  request.requestId = randomUUID();
  response.setHeader('x-request-id', request.requestId);
  next();
};
