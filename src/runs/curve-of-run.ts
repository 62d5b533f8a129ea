import type { LayeredEarthModel } from '../../server/contract/fit';
import type { Revision } from '../../server/contract/readings';
import type { Run } from '../../server/contract/runs';
import type { CurveLine, CurvePoint, CurveReading, GroundColumn } from '../charts/chart-data';
import { formatLength, withUnit } from '../ui/format';
import { letterOfRun, titleOfRun } from './run-title';
import { spacingLabel } from '../soundings/spread-words';

/** A kept reading as the fit takes it, with its place in the revision. */
export type KeptReading = Pick<
  Run['readings'][number],
  'row' | 'spread' | 'plottingSpacingM' | 'apparentResistivity' | 'relativeError'
>;

/** The readings a curve is drawn from: those that count, and those left out with their reason. */
export interface CurveData {
  kept: readonly KeptReading[];
  excluded: Run['excluded'];
}

export const curveDataOfRun = (run: Run): CurveData => ({ kept: run.readings, excluded: run.excluded });

export function curveDataOfRevision(revision: Revision): CurveData {
  const kept: KeptReading[] = [];
  const excluded: Run['excluded'] = [];
  revision.readings.forEach((reading, i) => {
    const derived = revision.derived[i];
    if (!derived) return;
    const at = { row: i + 1, plottingSpacingM: derived.plottingSpacingM };
    if (reading.excluded !== null)
      excluded.push({
        ...at,
        apparentResistivity: derived.apparentResistivityOhmM,
        reason: reading.excluded,
      });
    else
      kept.push({
        ...at,
        spread: reading.spread,
        apparentResistivity: derived.apparentResistivityOhmM,
        relativeError: derived.relativeError,
      });
  });
  return { kept, excluded };
}

/** Readings as charts take them, in the order of the sheet; those left out stand among the kept. */
export function chartReadings({ kept, excluded }: CurveData): CurveReading[] {
  const rows = [
    ...kept.map((reading) => ({
      row: reading.row,
      id: `row ${reading.row}`,
      spacing: reading.plottingSpacingM,
      label: spacingLabel(reading.spread),
      apparentResistivity: reading.apparentResistivity,
      relativeError: reading.relativeError,
      excluded: false,
    })),
    ...excluded.map((reading) => ({
      row: reading.row,
      id: `row ${reading.row}`,
      spacing: reading.plottingSpacingM,
      label: withUnit(formatLength(reading.plottingSpacingM), 'm'),
      apparentResistivity: reading.apparentResistivity,
      relativeError: 0,
      excluded: true,
      reason: reading.reason,
    })),
  ];
  return rows.toSorted((a, b) => a.row - b.row).map(({ row: _row, ...reading }) => reading);
}

/** Values of the kept readings spread over all readings in the sheet's order; null where one is left out. */
export function overReadings({ kept, excluded }: CurveData, values: readonly number[]): (number | null)[] {
  const byRow = new Map(kept.map((reading, i) => [reading.row, values[i] ?? null]));
  return [...kept, ...excluded]
    .map(({ row }) => row)
    .toSorted((a, b) => a - b)
    .map((row) => byRow.get(row) ?? null);
}

/** A predicted curve in order of spacing. */
export function curvePoints(kept: readonly KeptReading[], predicted: readonly number[]): CurvePoint[] {
  return kept
    .flatMap((reading, i) => {
      const apparentResistivity = predicted[i];
      return apparentResistivity !== undefined && apparentResistivity > 0
        ? [{ spacing: reading.plottingSpacingM, apparentResistivity }]
        : [];
    })
    .toSorted((a, b) => a.spacing - b.spacing);
}

/** The curve of a finished run; null before it has one. */
export function lineOfRun(run: Run, kind: CurveLine['kind'] = 'run'): CurveLine | null {
  if (!run.result) return null;
  const data = curveDataOfRun(run);
  return {
    id: run.id,
    kind,
    letter: letterOfRun(run),
    name: titleOfRun(run),
    points: curvePoints(run.readings, run.result.predicted),
    predicted: overReadings(data, run.result.predicted),
    residuals: overReadings(data, run.result.residuals),
  };
}

/** Beds of which any value was held in the fit. */
export function heldBeds(run: Pick<Run, 'settings'>): number[] {
  return [...new Set(run.settings.fixed.map((held) => held.index))].toSorted((a, b) => a - b);
}

export function columnOfRun(run: Run, bedNotes?: readonly (string | null)[]): GroundColumn | null {
  if (!run.result) return null;
  return {
    id: run.id,
    letter: letterOfRun(run),
    name: titleOfRun(run),
    earth: run.result.earth,
    intervals: run.result.intervals,
    lockedBeds: heldBeds(run),
    bedNotes,
  };
}

/** A model by hand has no intervals: nothing was computed about its doubt. */
export function columnOfHand(earth: LayeredEarthModel, lockedBeds: readonly number[]): GroundColumn {
  return { id: 'hand', letter: '', name: 'By hand', earth, lockedBeds };
}
