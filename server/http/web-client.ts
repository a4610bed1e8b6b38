import { readFileSync } from 'node:fs';
import path from 'node:path';
import express, { type RequestHandler, Router } from 'express';
import { notFound } from './api-error.ts';
import { nonceOf } from './browser-defences.ts';

const YEAR_MS = 31_536_000_000;
const HASHED = /-[A-Z0-9]{8}\.(js|css|woff2?)$/;
const NOT_BUILT = 'The client is not built. Run: npm run build\n';

/** Serves the built client: files with a hash in their name for a year, the page itself anew each time. */
export function webClient(folder: string): Router {
  const page = readPage(path.join(folder, 'index.html'));
  const files = express.static(folder, {
    ...{ index: false, dotfiles: 'ignore', redirect: false, etag: true },
    setHeaders: (response, file) => {
      const lasting = HASHED.test(file) || file.includes(`${path.sep}media${path.sep}`);
      response.set(
        'Cache-Control',
        lasting ? `public, max-age=${YEAR_MS / 1000}, immutable` : 'no-cache',
      );
    },
  });
  const showPage: RequestHandler = (request, response) => {
    if (path.extname(request.path) !== '') throw notFound();
    response.set('Cache-Control', 'no-store');
    if (page === null) response.status(503).type('text').send(NOT_BUILT);
    else response.type('html').send(page.replaceAll('%CSP_NONCE%', nonceOf(response.locals)));
  };
  const hidden: RequestHandler = (request, _response, next) => {
    // build reports and source maps are not for visitors, nor the page without its nonce
    if (/\.(map|json|html)$|\/\./.test(request.path)) throw notFound();
    next();
  };
  return Router().get('/{*path}', hidden, files, showPage);
}

function readPage(file: string): string | null {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return null;
  }
}
