import { resolve } from 'node:path';
import compression from 'compression';
import express, { type Express } from 'express';
import { pinoHttp } from 'pino-http';
import type { Container } from './container';
import { newestMigration } from './db/newest-migration';
import { serveClient } from './http/client-files';
import { mount } from './http/handle';
import { serveHealth } from './http/health';
import type { ServerModule } from './http/module';
import { openApiDocument } from './http/openapi';
import { checkOrigin } from './http/origin-check';
import { ProblemError } from './http/problem-error';
import { problemHandler } from './http/problem-details';
import { giveRequestId, requestIdOf } from './http/request-context';
import { securityHeaders } from './http/security-headers';

/** JSON bodies up to this many bytes are read: a speed trace of a day fits, a file does not. */
const JSON_LIMIT = 2 * 1024 * 1024;

/** Answers from this many bytes on are compressed; smaller ones fit into a packet or two anyway. */
const COMPRESSED_FROM = 2048;

/** The whole HTTP application. It never listens: `main.ts` and the tests do that, each in its own way. */
export function createApp(
  container: Container,
  modules: readonly ServerModule[],
  migrations = resolve('migrations'),
): Express {
  const { config } = container;
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  app.set('query parser', 'simple');
  app.set('trust proxy', config.trustedProxies);
  app.use(giveRequestId);
  app.use(
    pinoHttp({
      logger: container.logger,
      genReqId: (_req, res) => requestIdOf(res as express.Response),
      autoLogging: { ignore: (req) => req.url === '/healthz' || req.url === '/readyz' },
    }),
  );
  app.use(...securityHeaders(config.secure));
  app.use(compression({ threshold: COMPRESSED_FROM }));
  serveHealth(app, container.pools, newestMigration(migrations));
  app.use('/api', checkOrigin(config.publicOrigins));
  app.use('/api', express.json({ limit: JSON_LIMIT, strict: true, type: 'application/json' }));
  app.use('/api', container.sessions.middleware);

  const routes = modules.flatMap((module) => module.routes);
  for (const route of routes) mount(app, route, container);
  const document = openApiDocument(routes.map((route) => route.endpoint));
  app.get('/api/v1/openapi.json', (_req, res) => {
    res.setHeader('Cache-Control', 'no-cache');
    res.json(document);
  });
  app.use('/api', (_req, _res, next) => next(new ProblemError('not-found')));

  if (config.clientDirectory !== undefined) serveClient(app, config.clientDirectory);
  app.use((_req, _res, next) => next(new ProblemError('not-found')));
  app.use(problemHandler(container.log));
  return app;
}
