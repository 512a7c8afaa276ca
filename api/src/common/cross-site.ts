import type { NextFunction, Request, Response } from 'express';
import { DomainError } from './domain-error.js';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

function sameOrigin(request: Request, publicUrl: string): boolean {
  const site = request.headers['sec-fetch-site'];
  if (site !== undefined) return site === 'same-origin' || site === 'none';
  const { origin, host } = request.headers;
  if (!origin) return false;
  if (origin === new URL(publicUrl).origin) return true;
  // Plain http on a local network: browsers send no Sec-Fetch-Site there.
  return host !== undefined && [`http://${host}`, `https://${host}`].includes(origin);
}

/**
 * Refuse changing requests another site could have caused: they must say, by Fetch Metadata or
 * Origin, that they come from our own pages, and a body must be JSON, which no HTML form can send.
 */
export function refuseCrossSite(publicUrl: string) {
  return (request: Request, _: Response, next: NextFunction): void => {
    if (SAFE.has(request.method)) return next();
    if (!sameOrigin(request, publicUrl)) {
      return next(
        new DomainError('cross-site', 'Changes are accepted from Furrowlight’s own pages only.'),
      );
    }
    const hasBody =
      request.headers['transfer-encoding'] !== undefined ||
      Number(request.headers['content-length'] ?? 0) > 0;
    if (hasBody && !request.is('application/json')) {
      return next(new DomainError('not-json', 'Send the request as JSON.'));
    }
    next();
  };
}
