import { expect, it } from 'vitest';
import type { RunSummary } from '../../../../server/contract/runs';
import { baseOf, chosenRuns, searchOf, withRun } from '../../../../src/features/side-by-side/chosen-runs';

const known = ['a', 'b', 'c', 'd', 'e', 'f', 'g'];
const read = (text: string) => chosenRuns(new URLSearchParams(text), known);

it('reads known runs from the address, each once, six at most', () => {
  expect(read('runs=b,x,a,b').runIds).toEqual(['b', 'a']);
  expect(read('runs=a,b,c,d,e,f,g').runIds).toHaveLength(6);
});

it('begins with the two newest where the address names none, and leaves an empty choice empty', () => {
  expect(read('').runIds).toEqual(['a', 'b']);
  expect(read('runs=').runIds).toEqual([]);
});

it('takes the base from the address where that names one of the chosen', () => {
  expect(read('runs=b,a').baseId).toBeNull();
  expect(read('runs=b,a&base=a').baseId).toBe('a');
  expect(read('runs=b,a&base=c').baseId).toBeNull();
});

const run = (id: string, chi2PerReading: number, chance: number | null, more: Partial<RunSummary> = {}) =>
  ({
    id,
    interpretedAs: null,
    note: { pinned: false },
    outcome: { chi2PerReading, misfitProbability: chance },
    ...more,
  }) as RunSummary;
const PINNED = { note: { label: '', note: '', pinned: true, version: 1 } };
const baseAmong = (runs: RunSummary[], asked: string | null = null) =>
  baseOf({ runIds: runs.map(({ id }) => id), baseId: asked }, runs);

it('holds against a run that explains the readings, the closest of them', () => {
  expect(baseAmong([run('a', 28.9, 1e-9), run('b', 1.1, 0.3), run('c', 0.9, 0.6)])).toBe('c');
  expect(baseAmong([run('a', 28.9, 1e-9), run('b', 1.1, null)])).toBe('b');
  expect(baseAmong([run('a', 28.9, 1e-9), run('b', 12, 1e-5)])).toBe('b');
});

it('prefers what is interpreted, then what is pinned, unless the readings reject it', () => {
  const close = run('a', 0.5, 0.9);
  expect(baseAmong([close, run('b', 1.1, 0.3, PINNED)])).toBe('b');
  expect(baseAmong([close, run('b', 1.1, 0.3, PINNED), run('c', 1.2, 0.2, { interpretedAs: 'draft' })])).toBe(
    'c',
  );
  expect(baseAmong([close, run('b', 28.9, 1e-9, { interpretedAs: 'accepted' })])).toBe('a');
});

it('holds against the run that was asked for whatever it is, and only against chosen ones', () => {
  expect(baseAmong([run('a', 28.9, 1e-9), run('b', 1.1, 0.3)], 'a')).toBe('a');
  expect(baseOf({ runIds: ['a'], baseId: null }, [run('a', 9, 1e-9), run('b', 1, 0.5)])).toBe('a');
  expect(baseOf({ runIds: [], baseId: null }, [run('a', 1, 0.5)])).toBeNull();
});

it('writes an address that reads back the same', () => {
  for (const chosen of [
    { runIds: ['b', 'a'], baseId: 'a' },
    { runIds: ['b', 'a'], baseId: null },
    { runIds: [], baseId: null },
  ])
    expect(read(new URLSearchParams(searchOf(chosen)).toString())).toEqual(chosen);
});

it('adds up to six, and leaves the base open when its run is taken away', () => {
  expect(withRun({ runIds: ['a', 'b'], baseId: 'a' }, 'a', false)).toEqual({ runIds: ['b'], baseId: null });
  expect(withRun({ runIds: ['a', 'b'], baseId: 'b' }, 'a', false).baseId).toBe('b');
  const full = { runIds: ['a', 'b', 'c', 'd', 'e', 'f'], baseId: 'a' };
  expect(withRun(full, 'g', true)).toBe(full);
});
