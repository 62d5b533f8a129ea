import { Router, type Request, type RequestHandler } from 'express';
import multer from 'multer';
import type { z } from 'zod';
import { authenticate } from '../access/authenticate';
import type { Fault } from '../contract/common';
import { AppError } from '../errors';
import { faultsOfZod, IN_PLAIN_WORDS } from '../plain-faults';
import type { Context, Services } from './context';
import { Reply, type Endpoint, type EndpointInput } from './endpoint';
import { requestIdOf } from './request-id';

/** Mounts every endpoint: authenticate → parse → handle → answer. */
export function createRouter(endpoints: readonly Endpoint[], services: Services): Router {
  const router = Router();
  const upload = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: services.config.uploadLimitMb * 1_048_576, files: 1, fields: 20 },
    defParamCharset: 'utf8',
  }).single('file');
  for (const definition of endpoints) {
    const handlers: RequestHandler[] = [guard(definition, services)];
    if (definition.upload) handlers.push(upload);
    handlers.push(answer(definition));
    router[definition.method](definition.path, ...handlers);
  }
  return router;
}

/** Runs before any byte of an upload is read, so that a stranger cannot make the server hold a file. */
const guard =
  (definition: Endpoint, services: Services): RequestHandler =>
  async (request, response, next) => {
    // answers belong to one person at one moment; no browser or proxy keeps them
    response.set('Cache-Control', 'no-store');
    response.locals.context = await contextOf(definition, services, request);
    next();
  };

async function contextOf(definition: Endpoint, services: Services, request: Request): Promise<Context> {
  const actor = definition.access === 'public' ? null : await authenticate(services, request);
  if (definition.access === 'admin' && !actor?.isAdmin)
    throw new AppError('forbidden', 'Only an administrator may do this.');
  return {
    ...services,
    requestId: requestIdOf(request),
    clientAddress: request.ip ?? '',
    actor: actor as Context['actor'],
  };
}

const answer =
  (definition: Endpoint): RequestHandler =>
  async (request, response) => {
    const context = response.locals.context as Context;
    const result = await definition.handle(context, parse(definition, request) as never, {
      request,
      response,
    });
    if (definition.stream || response.headersSent) return;
    const usual = Number(Object.keys(definition.answers)[0]);
    const reply = result instanceof Reply ? result : new Reply(usual, result);
    const schema = definition.answers[reply.status];
    if (schema === undefined)
      throw new Error(`status ${reply.status} is not declared for ${definition.path}`);
    response.status(reply.status);
    if (schema === null) return void response.end();
    if (hasVersion(reply.body)) response.set('ETag', `"${reply.body.version}"`);
    response.json(reply.body);
  };

function parse(definition: Endpoint, request: Request): EndpointInput<undefined, undefined, undefined> {
  const faults: Fault[] = [];
  const read = (schema: z.ZodType | undefined, value: unknown, where: string): unknown => {
    if (!schema) return undefined;
    const result = schema.safeParse(value, IN_PLAIN_WORDS);
    if (result.success) return result.data;
    faults.push(...faultsOfZod(result.error, where));
    return undefined;
  };
  const params = read(definition.params, request.params, 'path');
  // an id that cannot be one names nothing
  if (faults.length > 0) throw new AppError('not-found', 'Nothing is at this address.');
  const query = read(definition.query, request.query, 'query');
  if (definition.body && !definition.upload && request.is('application/json') === false)
    throw new AppError('unsupported-media', 'Send the body as application/json.');
  const body = read(definition.body, request.body ?? {}, 'body');
  if (faults.length > 0) throw new AppError('invalid', summary(faults), { faults });
  const version = definition.versioned ? versionOf(request) : 0;
  return { params, query, body, version } as EndpointInput<undefined, undefined, undefined>;
}

const summary = (faults: Fault[]): string =>
  faults.length === 1 ? 'One value is not allowed.' : `${faults.length} values are not allowed.`;

function versionOf(request: Request): number {
  const header = request.get('If-Match');
  if (!header)
    throw new AppError(
      'version-required',
      'Send the version you edited, quoted, in If-Match; it is the ETag of the row.',
    );
  const match = /^"(\d{1,9})"$/.exec(header.trim());
  if (!match)
    throw new AppError('bad-request', `If-Match must be a quoted version such as "3"; found ${header}.`);
  return Number(match[1]);
}

const hasVersion = (body: unknown): body is { version: number } =>
  typeof body === 'object' && body !== null && 'version' in body && typeof body.version === 'number';
