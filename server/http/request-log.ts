import { randomUUID } from 'node:crypto';
import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Config } from '../config';
import { maskTokens } from './mask-tokens';

const PROBES = new Set(['/healthz', '/readyz']);

/** Numbers each request and, where asked, writes one line when it ends: no headers, no bodies, no secrets of links. */
export function requestLog(log: Logger, config: Pick<Config, 'logRequests'>): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    quietReqLogger: true,
    autoLogging: config.logRequests && { ignore: (request) => PROBES.has(request.url ?? '') },
    serializers: {
      req: (request: { method: string; url: string }) => ({
        method: request.method,
        url: maskTokens(request.url),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customSuccessObject: (request, _response, line: object) => ({ ...line, req: request }),
    customErrorObject: (request, _response, _error, line: object) => ({ ...line, req: request }),
  });
}
