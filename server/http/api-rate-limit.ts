import type { RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { ApiError } from './api-error.ts';

const IPV6_PREFIX = 56;

/** Requests a minute to the API, by person or, signed out, by address. */
export function apiRateLimit(perMinute: number): RequestHandler {
  return rateLimit({
    ...{ windowMs: 60_000, limit: perMinute, standardHeaders: 'draft-8', legacyHeaders: false },
    keyGenerator: (request) => request.user?.id ?? ipKeyGenerator(request.ip ?? '', IPV6_PREFIX),
    handler: (_request, response, next) => {
      const header = Number(response.getHeader('Retry-After'));
      next(
        new ApiError('too-many-requests', 'Too many requests. Wait a little, then try again.', {
          retryAfterSec: Number.isFinite(header) ? header : 60,
        }),
      );
    },
  });
}

/** One key for each IPv4 address and for each IPv6 site. */
export function addressKey(ip: string | undefined): string {
  return ipKeyGenerator(ip ?? '', IPV6_PREFIX);
}
