import { parse } from 'node:querystring';
import type { RequestHandler } from 'express';

/** Puts the request's cookies where the CSRF check looks for them. */
export const readCookies: RequestHandler = (request, _response, next) => {
  request.cookies = { ...parse(request.headers.cookie ?? '', '; ', '=') };
  next();
};
