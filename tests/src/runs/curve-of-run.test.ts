import { expect, it } from 'vitest';
import type { Revision } from '../../../server/contract/readings';
import {
  beyondOf,
  chartReadings,
  curveDataOfRevision,
  curvePoints,
  curveRequest,
  overReadings,
  residualsOf,
  spreadsOf,
} from '../../../src/runs/curve-of-run';

const reading = (halfAB: number, excluded: string | null = null): Revision['readings'][number] => ({
  spread: { type: 'schlumberger', halfAB, halfMN: 0.5 },
  voltageMv: null,
  currentMa: null,
  resistanceOhm: null,
  sheetApparentResistivityOhmM: 100,
  standardError: 0.02,
  remark: '',
  excluded,
});
const derived = (plottingSpacingM: number, apparentResistivityOhmM: number) => ({
  plottingSpacingM,
  geometricFactorM: null,
  resistanceOhm: null,
  apparentResistivityOhmM,
  relativeError: 0.036,
});
// Out of order on the sheet, with one reading left out between two that are kept.
const revision = {
  readings: [reading(10), reading(6.8, 'wet cable'), reading(2)],
  derived: [derived(10, 50), derived(6.8, 95), derived(2, 120)],
} as unknown as Revision;

it('keeps readings that count apart from those left out, with their rows', () => {
  const data = curveDataOfRevision(revision);
  expect(data.kept.map((kept) => [kept.row, kept.plottingSpacingM, kept.relativeError])).toEqual([
    [1, 10, 0.036],
    [3, 2, 0.036],
  ]);
  expect(data.excluded).toEqual([
    {
      row: 2,
      spread: { type: 'schlumberger', halfAB: 6.8, halfMN: 0.5 },
      plottingSpacingM: 6.8,
      apparentResistivity: 95,
      relativeError: 0.036,
      reason: 'wet cable',
    },
  ]);
});

it('draws all readings in the order of the sheet, hollow ones with their reason', () => {
  const readings = chartReadings(curveDataOfRevision(revision));
  expect(readings.map(({ spacing, excluded, reason }) => [spacing, excluded, reason])).toEqual([
    [10, false, undefined],
    [6.8, true, 'wet cable'],
    [2, false, undefined],
  ]);
  expect(readings[1]).toMatchObject({ label: 'AB/2 6.8\u00a0m', relativeError: 0.036 });
});

it('lays values of the kept readings, then of those left out, over all readings', () => {
  const data = curveDataOfRevision(revision);
  expect(overReadings(data, [1.5, -0.5])).toEqual([1.5, null, -0.5]);
  expect(overReadings(data, [1.5, -0.5, 3])).toEqual([1.5, 3, -0.5]);
});

it('tells how far a curve passes from a reading that was left out, in its own error', () => {
  const [residual] = residualsOf(curveDataOfRevision(revision).excluded, [95 * Math.exp(0.072)]);
  expect(residual).toBeCloseTo(2, 12);
});

it('asks the engine for the readings left out and then for the curve, and tells its answer apart', () => {
  const request = curveRequest(curveDataOfRevision(revision));
  const spreads = spreadsOf(request);
  expect(spreads[0]).toEqual({ type: 'schlumberger', halfAB: 6.8, halfMN: 0.5 });
  expect(spreads).toHaveLength(1 + 18);
  const beyond = beyondOf(
    request,
    spreads.map((_, i) => (i === 1 ? -1 : 100 + i)),
  );
  expect(beyond.excluded).toEqual([100]);
  expect(beyond.points?.[0]).toMatchObject({ apparentResistivity: 102 });
  expect(beyond.points).toHaveLength(17);
});

it('orders a predicted curve by spacing and leaves out what has no logarithm', () => {
  const { kept } = curveDataOfRevision(revision);
  expect(curvePoints(kept, [48, 118]).map((point) => point.spacing)).toEqual([2, 10]);
  expect(curvePoints(kept, [-1, 118])).toEqual([{ spacing: 2, apparentResistivity: 118 }]);
});
