import { expect, it } from 'vitest';
import { chosenRuns, searchOf, withRun } from '../../../../src/features/side-by-side/chosen-runs';

const known = new Set(['a', 'b', 'c', 'd', 'e', 'f', 'g']);
const read = (text: string) => chosenRuns(new URLSearchParams(text), known);

it('reads known runs from the address, each once, six at most', () => {
  expect(read('runs=b,x,a,b').runIds).toEqual(['b', 'a']);
  expect(read('runs=a,b,c,d,e,f,g').runIds).toHaveLength(6);
  expect(read('').runIds).toEqual([]);
});

it('holds against the first run unless the address names one of the chosen', () => {
  expect(read('runs=b,a').baseId).toBe('b');
  expect(read('runs=b,a&base=a').baseId).toBe('a');
  expect(read('runs=b,a&base=c').baseId).toBe('b');
  expect(read('').baseId).toBeNull();
});

it('writes an address that reads back the same', () => {
  for (const chosen of [
    { runIds: ['b', 'a'], baseId: 'a' },
    { runIds: ['b', 'a'], baseId: 'b' },
    { runIds: [], baseId: null },
  ])
    expect(read(new URLSearchParams(searchOf(chosen)).toString())).toEqual(chosen);
});

it('adds up to six and moves the base on when it is taken away', () => {
  expect(withRun({ runIds: ['a', 'b'], baseId: 'a' }, 'a', false)).toEqual({ runIds: ['b'], baseId: 'b' });
  expect(withRun({ runIds: ['a', 'b'], baseId: 'b' }, 'a', false).baseId).toBe('b');
  const full = { runIds: ['a', 'b', 'c', 'd', 'e', 'f'], baseId: 'a' };
  expect(withRun(full, 'g', true)).toBe(full);
});
