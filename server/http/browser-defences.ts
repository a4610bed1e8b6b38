import { randomBytes } from 'node:crypto';
import express, { type RequestHandler, Router } from 'express';
import helmet from 'helmet';

const YEAR_SEC = 31_536_000;
const REPORTS = '/csp-reports';
const NO_FEATURES = ['camera', 'geolocation', 'microphone', 'payment', 'usb']
  .map((feature) => `${feature}=()`)
  .join(', ');

/** Headers that keep a browser from doing what this application never asks of it. */
export function browserDefences(secure: boolean): RequestHandler[] {
  return [
    (_request, response, next) => {
      response.locals['cspNonce'] = randomBytes(16).toString('base64');
      response.set('Permissions-Policy', NO_FEATURES);
      response.set('Reporting-Endpoints', `csp="${REPORTS}"`);
      next();
    },
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: ["'self'"],
          styleSrc: [
            "'self'",
            (_request, response) => `'nonce-${nonceOf((response as express.Response).locals)}'`,
          ],
          imgSrc: ["'self'", 'data:', 'blob:'],
          ...Object.fromEntries(
            ['fontSrc', 'connectSrc', 'workerSrc', 'manifestSrc', 'baseUri', 'formAction'].map(
              (directive) => [directive, ["'self'"]],
            ),
          ),
          objectSrc: ["'none'"],
          frameAncestors: ["'none'"],
          requireTrustedTypesFor: ["'script'"],
          trustedTypes: ['angular', 'angular#bundler', 'dompurify'],
          reportTo: ['csp'],
        },
      },
      strictTransportSecurity: secure && { maxAge: YEAR_SEC, includeSubDomains: true },
      referrerPolicy: { policy: 'no-referrer' },
    }),
  ];
}

/** The nonce of this response, for the page's own style elements. */
export function nonceOf(locals: Record<string, unknown>): string {
  return String(locals['cspNonce']);
}

/** Where browsers report what the policy stopped. */
export function violationReports(): Router {
  const type = ['application/reports+json', 'application/csp-report'];
  return Router().post(REPORTS, express.json({ type, limit: '16kb' }), (request, response) => {
    const report = JSON.stringify(request.body ?? null).slice(0, 1000);
    request.log.warn({ event: 'csp-violation', report }, 'content security policy violated');
    response.status(204).end();
  });
}
