import { readdirSync } from 'node:fs';
import { join, relative, sep } from 'node:path';
import type { RequestHandler } from 'express';

/** What the build lays beside a file, best first. */
const ENCODINGS = [
  { name: 'br', ending: '.br' },
  { name: 'gzip', ending: '.gz' },
] as const;

/** The address of a file without the ending that its compressed form adds. */
export const withoutEncoding = (path: string) => path.replace(/\.(?:br|gz)$/, '');

/**
 * Sends a request for a file of the built client on to its compressed form, where there is one that the browser reads.
 * What is there is looked up once: the built client does not change under a running server.
 */
export function preferCompressed(directory: string): RequestHandler {
  const present = new Set(
    readdirSync(directory, { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => `/${relative(directory, join(entry.parentPath, entry.name)).split(sep).join('/')}`),
  );
  return (req, res, next) => {
    const forms = ENCODINGS.filter(({ ending }) => present.has(req.path + ending));
    if (!present.has(req.path) || forms.length === 0) {
      next();
      return;
    }
    res.vary('Accept-Encoding');
    const form = forms.find(({ name }) => req.acceptsEncodings(name) === name);
    if (form !== undefined) {
      res.type(req.path.slice(req.path.lastIndexOf('.')));
      res.setHeader('Content-Encoding', form.name);
      req.url = req.path + form.ending;
    }
    next();
  };
}
