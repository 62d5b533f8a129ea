import express from 'express';
import request from 'supertest';
import { expect, test } from 'vitest';
import { checkOrigin } from '../../../server/access/check-origin';
import { AppError, ERROR_STATUS } from '../../../server/errors';

const app = express()
  .use(checkOrigin({ publicUrl: 'https://wells.test/' }))
  .use((_request, response) => {
    response.json({ reached: true });
  })
  .use(((error, _request, response, _next) => {
    response.sendStatus(error instanceof AppError ? ERROR_STATUS[error.code] : 500);
  }) as express.ErrorRequestHandler);

const post = async (headers: Record<string, string>): Promise<number> =>
  (await request(app).post('/').set('Host', 'inner.test:4310').set(headers)).status;

test.each([
  ['the public address', { Origin: 'https://wells.test' }, 200],
  ['the address it was asked at', { Origin: 'http://inner.test:4310' }, 200],
  ['a program, which sends neither header', {}, 200],
  ['another site', { Origin: 'https://elsewhere.test' }, 403],
  ['a sandboxed or local page', { Origin: 'null' }, 403],
  ['the same host by another port', { Origin: 'http://inner.test:4311' }, 403],
  ['a name that only begins alike', { Origin: 'https://wells.test.elsewhere.test' }, 403],
  ['another site that hides its origin', { 'Sec-Fetch-Site': 'cross-site' }, 403],
  ['a sister site that hides its origin', { 'Sec-Fetch-Site': 'same-site' }, 403],
  [
    'a browser that contradicts itself',
    { Origin: 'https://wells.test', 'Sec-Fetch-Site': 'cross-site' },
    403,
  ],
  ['an own page', { Origin: 'https://wells.test', 'Sec-Fetch-Site': 'same-origin' }, 200],
])('a change from %s', async (_from, headers, status) => {
  expect(await post(headers)).toBe(status);
});

test('reading is open: it changes nothing, and other sites cannot see the answer', async () => {
  const answer = await request(app).get('/').set('Origin', 'https://elsewhere.test');
  expect(answer.status).toBe(200);
  expect(answer.headers['access-control-allow-origin']).toBeUndefined();
});
