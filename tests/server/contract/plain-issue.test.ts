import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { spreadSchema } from '../../../server/contract/spread';
import { faultsOfZod, IN_PLAIN_WORDS } from '../../../server/plain-faults';

const faults = (schema: z.ZodType, value: unknown) => {
  const { error } = schema.safeParse(value, IN_PLAIN_WORDS);
  return error ? faultsOfZod(error, 'body') : [];
};

/** The first fault as a form tells it: what is wrong, what was found, what is allowed. */
function told(schema: z.ZodType, value: unknown): (string | undefined)[] {
  const [fault] = faults(schema, value);
  return [fault?.message, fault?.found, fault?.allowed];
}

describe('what is not allowed, in plain words', () => {
  it.each<[z.ZodType, unknown, (string | undefined)[]]>([
    [z.number(), undefined, ['is missing', undefined, 'a number']],
    [z.number(), null, ['is not a number', 'nothing', 'a number']],
    [z.number(), 'east', ['is not a number', 'east', 'a number']],
    [z.number().int(), 2.5, ['is not a whole number', '2.5', 'a whole number']],
    [z.string(), 12345678, ['is not text', 'a number', 'text']],
    [z.array(z.number()), { a: 1 }, ['is not a list', 'an object', 'a list']],
    [
      z.strictObject({}),
      ['1'],
      ['is not an object with named fields', 'a list', 'an object with named fields'],
    ],
    [z.number(), [10, 1], ['is not a number', '[10, 1]', 'a number']],
    [z.number(), [], ['is not a number', 'a list', 'a number']],
    [z.string().min(1), '', ['is empty', '0 characters', 'at least 1 character']],
    [z.string().min(12), 'secret', ['is too short', '6 characters', 'at least 12 characters']],
    [z.string().max(3), 'long', ['is too long', '4 characters', 'at most 3 characters']],
    [z.array(z.number()).min(2), [1], ['has too few entries', '1 entry', 'at least 2 entries']],
    [z.array(z.number()).max(1), [1, 2], ['has too many entries', '2 entries', 'at most 1 entry']],
    [z.number().min(0), -1, ['is too small', '-1', 'at least 0']],
    [z.number().gt(0), 0, ['is too small', '0', 'above 0']],
    [z.number().max(9), 10, ['is too large', '10', 'at most 9']],
    [z.number().max(1e6), 1e7, ['is too large', '10000000', 'at most 1\u202f000\u202f000']],
    [z.number().lt(360), 360, ['is too large', '360', 'below 360']],
    [z.enum(['a', 'b']), 'c', ['is none of what can be chosen', 'c', 'a, b']],
    [z.enum(['a', 'b']), undefined, ['is missing', undefined, 'a, b']],
    [
      z.email(),
      'nobody',
      ['is not an e-mail address', 'nobody', 'an e-mail address, such as name@example.org'],
    ],
    [
      z.iso.date(),
      '9 March',
      ['is not a date', '9 March', 'a date as year, month and day, such as 2024-03-09'],
    ],
    [z.uuid(), 'x'.repeat(90), ['is not an id', `${'x'.repeat(59)}…`, 'an id as the server gives it']],
    [z.string().regex(/^a/), 'b', ['is not written as asked for', 'b', undefined]],
    [
      z.union([z.number().int(), z.literal('auto')]),
      'many',
      ['is none of what can be chosen', 'many', 'a number or auto'],
    ],
    [
      z.discriminatedUnion('on', [z.object({ on: z.literal('a') }), z.object({ on: z.literal('b') })]),
      { on: 'c' },
      ['is none of what can be chosen', 'c', 'a, b'],
    ],
  ])('%#', (schema, value, expected) => {
    expect(told(schema, value)).toEqual(expected);
  });

  it('name each unknown field at its own place', () => {
    expect(faults(z.strictObject({ in: z.strictObject({}) }), { in: { one: 1, two: 2 } })).toEqual([
      { path: ['body', 'in', 'one'], message: 'is no known field' },
      { path: ['body', 'in', 'two'], message: 'is no known field' },
    ]);
  });

  it('are left to the schema where it says something itself', () => {
    expect(told(z.string().min(12, 'must have at least 12 characters'), 'secret')).toEqual([
      'must have at least 12 characters',
      '6 characters',
      undefined,
    ]);
    const even = z.number().refine((value) => value % 2 === 0, { message: 'must be even' });
    expect(told(even, 3)).toEqual(['must be even', undefined, undefined]);
  });

  it('name the kinds of spread', () => {
    const [message, found, allowed] = told(spreadSchema, { type: 'round' });
    expect([message, found]).toEqual(['is none of what can be chosen', 'round']);
    expect(allowed).toContain('schlumberger, ');
  });

  it('say what null stands for where it may stand for a length', () => {
    const recorded = { type: 'schlumberger', halfAB: 10 };
    expect(told(spreadSchema, recorded)).toEqual([
      'is missing; it must be a number, or null where MN was not recorded',
      undefined,
      undefined,
    ]);
    expect(told(spreadSchema, { ...recorded, halfMN: 'none' })).toEqual([
      'must be a number, or null where MN was not recorded',
      'none',
      undefined,
    ]);
    expect(told(spreadSchema, { ...recorded, halfMN: 0 })).toEqual(['is too small', '0', 'above 0']);
    expect(told(spreadSchema, { type: 'electrodes', an: null, bm: null, bn: null })[0]).toContain(
      'or null for an electrode at infinity',
    );
  });
});
