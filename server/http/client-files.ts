import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import express, { type IRouter, type RequestHandler } from 'express';
import { preferCompressed, withoutEncoding } from './compressed-files';
import { ProblemError } from './problem-error';
import { nonceOf } from './security-headers';

/** The placeholder that the built page carries where each answer's own nonce belongs. */
const PLACEHOLDER = 'CSP_NONCE';

/**
 * Serves the built client. Files whose name carries a hash of their content may be kept for ever; every other
 * address outside the API is the page itself, with the nonce of this very answer filled in.
 */
export function serveClient(router: IRouter, directory: string): void {
  const page = readFileSync(join(directory, 'index.html'), 'utf8');
  const sendPage: RequestHandler = (_req, res) => {
    res.setHeader('Cache-Control', 'no-store');
    res.type('html').send(page.replaceAll(PLACEHOLDER, nonceOf(res)));
  };
  router.get('/', sendPage);
  router.get('/index.html', sendPage);
  router.use(
    preferCompressed(directory),
    express.static(directory, {
      index: false,
      redirect: false,
      dotfiles: 'ignore',
      setHeaders: (res, path) => {
        const hashed = /-[A-Z0-9]{8}\.[a-z0-9]+$/.test(withoutEncoding(path));
        res.setHeader('Cache-Control', hashed ? 'public, max-age=31536000, immutable' : 'no-cache');
      },
    }),
  );
  router.get('/{*path}', (req, res, next) => {
    // A missing file stays missing: a page in its place would hide the mistake.
    const isFile = /\.[a-z0-9]{2,5}$/i.test(req.path);
    if (isFile || req.path.startsWith('/api/')) next(new ProblemError('not-found'));
    else sendPage(req, res, next);
  });
}
