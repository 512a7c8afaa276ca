import { randomUUID } from 'node:crypto';
import type { NestExpressApplication } from '@nestjs/platform-express';
import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type NextFunction, type Request, type Response } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { AppConfig } from '../config/app-config.js';
import { contractPipe } from './contract-pipe.js';
import { refuseCrossSite } from './cross-site.js';
import { Log } from './log.js';
import { serveDocs } from './openapi.js';
import { servePages } from './pages.js';
import { ProblemFilter } from './problem-filter.js';

/** Weather files travel inside JSON; nothing else needs more than a megabyte. */
const WEATHER_LIMIT = '15mb';
const BODY_LIMIT = '1mb';

function tileOrigins(config: AppConfig): string[] {
  return config.tileLayers.flatMap(({ url }) => {
    if (!/^https?:/.test(url)) return [];
    const { protocol, host } = new URL(url.replaceAll(/\{s\}\.?/g, ''));
    return url.includes('{s}') ? [`${protocol}//*.${host}`] : [`${protocol}//${host}`];
  });
}

/** No inline script anywhere; inline style only because the component library sets it. */
function securityHeaders(config: AppConfig) {
  const tiles = tileOrigins(config);
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:', ...tiles],
        connectSrc: ["'self'", ...tiles],
        fontSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(config.secureCookies ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: config.secureCookies
      ? { maxAge: 63_072_000, includeSubDomains: true }
      : false,
    crossOriginEmbedderPolicy: false,
    crossOriginOpenerPolicy: config.secureCookies,
    originAgentCluster: config.secureCookies,
    // OpenStreetMap's tile policy wants to know the site; paths and tokens stay private.
    referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
  });
}

/** A path for the log: query strings may carry what is not ours to keep. */
function requestLog(log: Log) {
  return pinoHttp({
    logger: log.pino,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'error' : 'info'),
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?')[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  });
}

function privateAnswers(request: Request, response: Response, next: NextFunction): void {
  response.setHeader('Cache-Control', 'private, no-store');
  // ETags name row versions for writes; they do not validate caches.
  delete request.headers['if-none-match'];
  next();
}

/** Everything between the socket and the controllers; the same for server and tests. */
export function configureHttp(app: NestExpressApplication): void {
  const config = app.get(AppConfig);
  const log = app.get(Log);
  app.set('trust proxy', config.trustedProxies);
  app.set('etag', false);
  app.set('query parser', 'simple');
  app.use(requestLog(log));
  app.use(securityHeaders(config));
  app.use(compression());
  const pages = servePages(config.webDir);
  app.use((request: Request, response: Response, next: NextFunction) => {
    if (/^\/api(\/|$)/.test(request.path)) next();
    else pages(request, response, next);
  });
  app.use('/api', privateAnswers, refuseCrossSite(config.publicUrl));
  app.use('/api/weather', express.json({ limit: WEATHER_LIMIT }));
  app.use('/api', express.json({ limit: BODY_LIMIT }));
  app.use('/api', cookieParser());
  app.setGlobalPrefix('api');
  app.useGlobalPipes(contractPipe());
  app.useGlobalFilters(new ProblemFilter(log));
  serveDocs(app);
  app.enableShutdownHooks();
}
