import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { createSoundingSchema } from '../../../server/contract/soundings';
import { plainIssue } from '../../../src/ui/plain-issue';
import { mergeRows, versionFields } from '../../../src/ui/version-fields';

const messageFor = (schema: z.ZodType, value: unknown): string | undefined =>
  schema.safeParse(value, { error: plainIssue }).error?.issues[0]?.message;

describe('issues in plain words', () => {
  it.each([
    [z.string().min(1), '', 'Must not be empty'],
    [z.string().min(12), 'short', 'Must have at least 12 characters'],
    [z.string().max(3), 'long', 'Must have at most 3 characters'],
    [z.number().min(0), -1, 'Must be at least 0'],
    [z.number().gt(0), 0, 'Must be above 0'],
    [z.number().max(9), 10, 'Must be at most 9'],
    [z.number().lt(360), 360, 'Must be below 360'],
    [z.number(), Number.NaN, 'Must not be empty'],
    [z.email(), 'nobody', 'Write an e-mail address, such as name@example.org'],
    [z.iso.date(), '9 March', 'Write a date as year, month and day, such as 2024-03-09'],
    [z.enum(['a', 'b']), 'c', 'Choose one of: a, b'],
  ])('%#', (schema, value, expected) => {
    expect(messageFor(schema, value)).toBe(expected);
  });

  it('let the contract speak where it says something itself', () => {
    expect(messageFor(z.string().min(12, 'must have at least 12 characters'), 'a')).toBe(
      'must have at least 12 characters',
    );
    expect(messageFor(createSoundingSchema.shape.name, ' ')).toBe('Must not be empty');
  });
});

describe('two versions of a row', () => {
  const base = { name: 'S-1', note: '', xM: 1 };
  const mine = { name: 'S-1', note: 'mine', xM: 2 };
  const theirs = { name: 'S-2', note: '', xM: 3, version: 4 };
  const labels = { name: 'Name', note: 'Note', xM: 'x' };

  it('are shown field by field in the order of the form', () => {
    const fields = versionFields(labels, { base, mine, theirs });
    expect(fields.map((field) => field.label)).toEqual(['Name', 'Note', 'x']);
    expect(fields[2]).toEqual({ key: 'xM', label: 'x', base: '1', mine: '2', theirs: '3' });
  });

  it('are merged without losing what was not given up, and without foreign fields', () => {
    expect(mergeRows(mine, theirs, new Set(['name', 'version']))).toEqual({
      name: 'S-2',
      note: 'mine',
      xM: 2,
    });
    expect(mergeRows(mine, theirs, new Set())).toEqual(mine);
  });
});
