import { expect, it } from 'vitest';
import type { Revision } from '../../../server/contract/readings';
import {
  chartReadings,
  curveDataOfRevision,
  curvePoints,
  overReadings,
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
    { row: 2, plottingSpacingM: 6.8, apparentResistivity: 95, reason: 'wet cable' },
  ]);
});

it('draws all readings in the order of the sheet, hollow ones with their reason', () => {
  const readings = chartReadings(curveDataOfRevision(revision));
  expect(readings.map(({ spacing, excluded, reason }) => [spacing, excluded, reason])).toEqual([
    [10, false, undefined],
    [6.8, true, 'wet cable'],
    [2, false, undefined],
  ]);
});

it('lays values of the kept readings over all readings', () => {
  expect(overReadings(curveDataOfRevision(revision), [1.5, -0.5])).toEqual([1.5, null, -0.5]);
});

it('orders a predicted curve by spacing and leaves out what has no logarithm', () => {
  const { kept } = curveDataOfRevision(revision);
  expect(curvePoints(kept, [48, 118]).map((point) => point.spacing)).toEqual([2, 10]);
  expect(curvePoints(kept, [-1, 118])).toEqual([{ spacing: 2, apparentResistivity: 118 }]);
});
