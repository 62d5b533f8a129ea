import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ApiError } from '../../../src/api/api-error';
import { readEvent, waitBeforeRetry } from '../../../src/api/event-stream';
import { formFaults } from '../../../src/api/form-faults';
import { createQueryClient } from '../../../src/api/query-client';
import { shouldRetry } from '../../../src/api/retry-rule';
import { returnAddress, signInAddress } from '../../../src/api/return-address';
import { meKey } from '../../../src/api/session-queries';

const failure = (status: number, code = 'x') => new ApiError(code, 'A sentence.', { status });

describe('retrying', () => {
  it('asks again after a lost connection or a server at fault, never after a refusal', () => {
    expect(shouldRetry(0, failure(0))).toBe(true);
    expect(shouldRetry(1, failure(503))).toBe(true);
    for (const status of [400, 401, 403, 404, 409, 422, 429])
      expect(shouldRetry(0, failure(status))).toBe(false);
    expect(shouldRetry(0, new TypeError('a fault of our own'))).toBe(false);
  });

  it('gives up after two more attempts', () => {
    expect(shouldRetry(2, failure(503))).toBe(false);
  });

  it('waits longer each time for a stream, but not without end', () => {
    expect([0, 1, 2].map(waitBeforeRetry)).toEqual([500, 1000, 2000]);
    expect(waitBeforeRetry(50)).toBe(15_000);
  });
});

describe('a session that ended', () => {
  it('is noted when any query is refused for it', async () => {
    const client = createQueryClient();
    client.setQueryData(meKey, { id: '1' });
    const ask = (error: Error) =>
      client.fetchQuery({ queryKey: ['x'], queryFn: () => Promise.reject(error) }).catch(() => undefined);
    await ask(failure(403, 'forbidden'));
    expect(client.getQueryData(meKey)).toEqual({ id: '1' });
    await ask(failure(401, 'unauthenticated'));
    expect(client.getQueryData(meKey)).toBeNull();
  });

  it('leads to the sign-in page and back', () => {
    expect(signInAddress('/soundings/7/readings?revision=2')).toBe(
      '/sign-in?next=%2Fsoundings%2F7%2Freadings%3Frevision%3D2',
    );
    expect(returnAddress('/soundings/7/readings?revision=2')).toBe('/soundings/7/readings?revision=2');
    expect(signInAddress('/')).toBe('/sign-in');
  });

  it.each([
    '//elsewhere.example/',
    '/\\elsewhere.example',
    'https://elsewhere.example',
    '/sign-in?next=/',
    null,
  ])('does not lead to %s', (next) => expect(returnAddress(next)).toBe('/'));
});

describe('events', () => {
  const schema = z.strictObject({ n: z.number() });
  it('are read by the contract and dropped when they are not what was agreed on', () => {
    expect(readEvent('{"n":1}', schema)).toEqual({ n: 1 });
    expect(readEvent('{"n":"1"}', schema)).toBeUndefined();
    expect(readEvent('not JSON', schema)).toBeUndefined();
  });
});

describe('faults of a form', () => {
  it('name the field by its label, count from one and say what is allowed', () => {
    const error = new ApiError('invalid', 'Two values.', {
      status: 422,
      faults: [
        { path: ['body', 'name'], message: 'Is missing.' },
        { path: ['body', 'intervals', 0, 'topM'], message: 'Is too small.', allowed: '0 or more' },
      ],
    });
    expect(formFaults(error, { name: 'Name' })).toEqual([
      { field: 'Name', message: 'Is missing.' },
      { field: 'intervals 1 topM', message: 'Is too small. Allowed: 0 or more.' },
    ]);
  });

  it('are the one sentence where no field is named, and none where nothing failed', () => {
    expect(formFaults(failure(403))).toEqual([{ message: 'A sentence.' }]);
    expect(formFaults(null)).toEqual([]);
  });
});
