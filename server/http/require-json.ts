import type { RequestHandler } from 'express';
import { ApiError } from './api-error.ts';

/** Bodies are JSON: a form of another site can only send something else. */
export const requireJson: RequestHandler = (request, _response, next) => {
  const hasBody =
    request.get('Transfer-Encoding') !== undefined ||
    (request.get('Content-Length') ?? '0') !== '0';
  if (
    hasBody &&
    !/^application\/json(\s*;\s*charset="?utf-8"?)?\s*$/i.test(request.get('Content-Type') ?? '')
  ) {
    throw new ApiError('unsupported-type', 'Send application/json.');
  }
  next();
};
