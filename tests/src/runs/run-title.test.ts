import { expect, it } from 'vitest';
import { letterOfRun, titleOfRun } from '../../../src/runs/run-title';
import type { RunSummary } from '../../../server/contract/runs';

const run = (layers: number | 'auto', fixed = 0, found?: number, label = '') =>
  ({
    settings: {
      kind: 'layered',
      layers,
      seed: 1,
      bounds: { resistivity: [0.1, 1e5], thickness: [0.02, 1000] },
      fixed: Array.from({ length: fixed }, (_, index) => ({ on: 'resistivity', index, value: 1 })),
    },
    outcome:
      found === undefined
        ? null
        : {
            earth: { resistivity: Array(found).fill(1), thickness: Array(found - 1).fill(1) },
            status: 'converged-step',
            chi2PerReading: 1,
            rmsPercent: 3,
          },
    note: { label, note: '', pinned: false, version: 1 },
  }) as Pick<RunSummary, 'settings' | 'outcome' | 'note'>;

it('names runs by letter from A', () => {
  expect([1, 26, 27].map((number) => letterOfRun({ number }))).toEqual(['A', 'Z', 'AA']);
});

it('says what a run is', () => {
  expect(titleOfRun(run(4, 0, 4))).toBe('4 beds');
  expect(titleOfRun(run(4, 2))).toBe('4 beds, 2 values held');
  expect(titleOfRun(run('auto'))).toBe('finding the count');
  expect(titleOfRun(run('auto', 0, 1))).toBe('1 bed, count found');
  expect(titleOfRun(run(4, 1, 4, 'held at borehole'))).toBe('held at borehole');
});

it('calls a ground of cells by the name it is asked for with', () => {
  const cells = (kind: 'smooth' | 'stepped', found?: number) => {
    const beds = run('auto', 0, found);
    return titleOfRun({ ...beds, settings: { ...beds.settings, kind } });
  };
  expect(cells('stepped', 24)).toBe('few steps, 24 cells');
  expect(cells('smooth', 24)).toBe('smooth, 24 cells');
  expect(cells('stepped')).toBe('few steps');
});
