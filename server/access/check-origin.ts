import type { Request, RequestHandler } from 'express';
import type { Config } from '../config';
import { AppError } from '../errors';

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses changes that another site's page asks a visitor's browser to make. Every browser sends Origin with such requests,
 * and pages cannot forge it; a request with neither header comes from a program that holds the cookie by right.
 * SameSite=Lax on the cookie is the second lock.
 */
export function checkOrigin(config: Pick<Config, 'publicUrl'>): RequestHandler {
  const publicOrigin = new URL(config.publicUrl).origin;
  return (request, _response, next) => {
    if (!SAFE_METHODS.has(request.method) && !isOwn(request, publicOrigin))
      throw new AppError('forbidden', 'Changes are taken only from the pages of this server.');
    next();
  };
}

function isOwn(request: Request, publicOrigin: string): boolean {
  const origin = request.get('Origin');
  if (origin === undefined) return !['cross-site', 'same-site'].includes(request.get('Sec-Fetch-Site') ?? '');
  if (request.get('Sec-Fetch-Site') === 'cross-site') return false;
  return origin === publicOrigin || origin === `${request.protocol}://${request.get('Host')}`;
}
