import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ApiError, currentOf } from '../../../src/api/api-error';
import { getJson, queryText, sendJson, sendJsonWithStatus } from '../../../src/api/http';

interface Asked {
  method: string;
  url: string;
  headers: IncomingMessage['headers'];
  body: string;
}

const asked: Asked[] = [];
let answer: (response: ServerResponse) => void = (response) => response.end('{}');

// a real server on loopback; the client asks below its own page's address, so that one is stood in for
const server = createServer((request, response) => {
  let body = '';
  request.on('data', (chunk: Buffer) => (body += chunk.toString()));
  request.on('end', () => {
    asked.push({ method: request.method ?? '', url: request.url ?? '', headers: request.headers, body });
    answer(response);
  });
});
const realFetch = globalThis.fetch;

beforeAll(async () => {
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  globalThis.fetch = (input, init) =>
    realFetch(new URL(typeof input === 'string' ? input : '/', origin), init);
});
afterEach(() => {
  asked.length = 0;
});
afterAll(() => {
  globalThis.fetch = realFetch;
  server.close();
});

const json = (status: number, body: unknown, headers: Record<string, string> = {}) => {
  answer = (response) => {
    response.writeHead(status, { 'Content-Type': 'application/json', ...headers });
    response.end(JSON.stringify(body));
  };
};

const schema = z.strictObject({ version: z.number(), name: z.string() });

const problem = (code: string, status: number, more: object = {}) => ({
  type: `/api/docs/problems#${code}`,
  title: 'Title',
  status,
  code,
  detail: 'A sentence.',
  instance: '/api/v1/things',
  requestId: 'r1',
  ...more,
});

const thrownBy = async (work: Promise<unknown>): Promise<ApiError> => {
  const error: unknown = await work.then(
    () => null,
    (thrown: unknown) => thrown,
  );
  expect(error).toBeInstanceOf(ApiError);
  return error as ApiError;
};

describe('requests', () => {
  it('asks below the API and parses the answer', async () => {
    json(200, { version: 1, name: 'a' });
    await expect(getJson('/things/1', schema)).resolves.toEqual({ version: 1, name: 'a' });
    expect(asked[0]).toMatchObject({ method: 'GET', url: '/api/v1/things/1' });
  });

  it('sends the version as a quoted If-Match, and the body as JSON', async () => {
    json(200, { version: 4, name: 'b' });
    await sendJson('PATCH', '/things/1', { name: 'b' }, schema, { version: 3 });
    expect(asked[0]?.headers['if-match']).toBe('"3"');
    expect(asked[0]?.headers['content-type']).toBe('application/json');
    expect(asked[0]?.body).toBe('{"name":"b"}');
  });

  it('gives null where no content is answered, and tells the status where it is asked for', async () => {
    answer = (response) => response.writeHead(204).end();
    await expect(sendJson('DELETE', '/things/1', undefined, null)).resolves.toBeNull();
    expect(asked[0]?.headers['content-type']).toBeUndefined();
    json(201, { version: 1, name: 'c' });
    await expect(sendJsonWithStatus('POST', '/things', {}, schema)).resolves.toMatchObject({ status: 201 });
  });

  it('writes a query without empty and absent values', () => {
    expect(queryText({ page: 2, search: '', lineId: undefined })).toBe('?page=2');
    expect(queryText({ search: '' })).toBe('');
  });
});

describe('failures', () => {
  it('carries code, sentence and faults of a refusal', async () => {
    const faults = [{ path: ['body', 'name'], message: 'is missing' }];
    json(422, problem('invalid', 422, { faults }));
    const error = await thrownBy(getJson('/things', schema));
    expect(error).toMatchObject({ code: 'invalid', status: 422, message: 'A sentence.', faults });
  });

  it('gives the row as it now stands, and only of a conflict', async () => {
    const current = { version: 5, name: 'theirs' };
    json(409, problem('conflict', 409, { current }));
    expect(currentOf(await thrownBy(getJson('/things', schema)), schema)).toEqual(current);
    json(409, problem('wrong-state', 409, { current }));
    expect(currentOf(await thrownBy(getJson('/things', schema)), schema)).toBeNull();
  });

  it('tells how long to wait', async () => {
    json(429, problem('rate-limited', 429), { 'Retry-After': '30' });
    expect((await thrownBy(getJson('/things', schema))).retryAfterS).toBe(30);
  });

  it('does not take an answer that is not what was agreed on', async () => {
    json(200, { version: 'one', name: 'a' });
    const error = await thrownBy(getJson('/things', schema));
    expect(error.code).toBe('unexpected-answer');
    expect(error.message).toContain('version');
  });

  it('tells of a failure that is no problem document, and of no answer at all', async () => {
    answer = (response) => response.writeHead(502).end('<html>');
    expect(await thrownBy(getJson('/things', schema))).toMatchObject({ code: 'no-answer', status: 502 });
    answer = (response) => response.destroy();
    expect(await thrownBy(getJson('/things', schema))).toMatchObject({ code: 'unreachable', status: 0 });
  });
});
