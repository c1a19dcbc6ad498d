import { randomBytes } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

/** Gives each response a nonce for the few style elements that the framework adds at run time. */
const giveNonce: RequestHandler = (_req, res, next) => {
  res.locals['nonce'] = randomBytes(18).toString('base64');
  next();
};

export function nonceOf(res: Response): string {
  const value: unknown = res.locals['nonce'];
  if (typeof value !== 'string') throw new Error('the response has no nonce');
  return value;
}

/** The content security policy: nothing but our own files, and no inline script at all. */
export function securityHeaders(secure: boolean): readonly RequestHandler[] {
  return [
    giveNonce,
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'", (_req, res) => `'nonce-${nonceOf(res as Response)}'`],
          imgSrc: ["'self'", 'data:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          baseUri: ["'self'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
        },
      },
      strictTransportSecurity: secure ? { maxAge: 31_536_000 } : false,
      crossOriginOpenerPolicy: { policy: 'same-origin' },
      crossOriginResourcePolicy: { policy: 'same-origin' },
      referrerPolicy: { policy: 'no-referrer' },
      xFrameOptions: { action: 'deny' },
    }),
  ];
}
