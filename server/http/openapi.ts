import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import { problemSchema } from '../contract/common';
import type { Endpoint } from './endpoint';

const PROBLEM = { 'application/problem+json': { schema: problemSchema } };

/** The OpenAPI 3.1 text of the endpoints, made from the same schemas that parse and answer. */
export function openApiDocument(endpoints: readonly Endpoint[], serverUrl: string): object {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: 'layerwell_session',
  });
  for (const definition of endpoints) registry.registerPath(pathOf(definition));
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Layerwell',
      version: '1',
      description:
        'Everything the browser does goes through these addresses. Lengths in m, resistivity in Ω·m, errors relative. ' +
        'Failures are problem details (RFC 9457). A resistivity model is not proof of water.',
    },
    servers: [{ url: serverUrl }],
  });
}

function pathOf(definition: Endpoint): Parameters<OpenAPIRegistry['registerPath']>[0] {
  const responses: Record<string, object> = {};
  for (const [status, schema] of Object.entries(definition.answers)) {
    const type = definition.stream ? 'text/event-stream' : 'application/json';
    responses[status] = schema
      ? { description: definition.summary, content: { [type]: { schema } } }
      : { description: 'Done; no content.' };
  }
  if (definition.access !== 'public') responses['401'] = { description: 'Not signed in', content: PROBLEM };
  if (definition.params)
    responses['404'] = { description: 'Not found, or not visible to you', content: PROBLEM };
  if (definition.access !== 'public' && definition.method !== 'get')
    responses['403'] = { description: 'Visible, but your role may not do this', content: PROBLEM };
  if (definition.body ?? definition.query)
    responses['422'] = { description: 'Values not allowed', content: PROBLEM };
  if (definition.versioned) responses['409'] = { description: 'Changed by someone else', content: PROBLEM };
  const headers = definition.versioned
    ? z.object({ 'If-Match': z.string().describe('the ETag of the row you edited') })
    : undefined;
  return {
    method: definition.method,
    path: `/api/v1${definition.path.replace(/:(\w+)/g, '{$1}')}`,
    summary: definition.summary,
    tags: [definition.tag],
    security: definition.access === 'public' ? [] : [{ session: [] }],
    request: {
      ...(definition.params && { params: definition.params }),
      ...(definition.query && { query: definition.query }),
      ...(headers && { headers }),
      ...(definition.body && {
        body: { content: { [bodyType(definition)]: { schema: bodySchema(definition) } } },
      }),
    },
    responses,
  };
}

const bodyType = (definition: Endpoint): string =>
  definition.upload ? 'multipart/form-data' : 'application/json';

const bodySchema = (definition: Endpoint): z.ZodType =>
  definition.upload && definition.body instanceof z.ZodObject
    ? definition.body.extend({ file: z.string().meta({ format: 'binary' }) })
    : (definition.body as z.ZodType);
