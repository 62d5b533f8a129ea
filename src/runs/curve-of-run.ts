import { hasCells } from '../../inversion';
import type { FitReading, LayeredEarthModel } from '../../server/contract/fit-settings';
import type { Revision } from '../../server/contract/readings';
import type { Run } from '../../server/contract/runs';
import type { CurveLine, CurvePoint, CurveReading, GroundColumn, HeldValue } from '../charts/chart-data';
import { curvePlaces, type CurvePlace } from './curve-places';
import { isRejected } from './rejected-fit';
import { letterOfRun, titleOfRun } from './run-title';
import { halfMNOf, spacingLabel } from '../soundings/spread-words';

/** A kept reading as the fit takes it, with its place in the revision. */
export type KeptReading = Pick<
  Run['readings'][number],
  'row' | 'spread' | 'plottingSpacingM' | 'apparentResistivity' | 'relativeError'
>;

export type ExcludedReading = Run['excluded'][number];

/** The readings a curve is drawn from: those that count, and those left out with their reason. */
export interface CurveData {
  kept: readonly KeptReading[];
  excluded: readonly ExcludedReading[];
}

export const curveDataOfRun = (run: Run): CurveData => ({ kept: run.readings, excluded: run.excluded });

export function curveDataOfRevision(revision: Revision): CurveData {
  const kept: KeptReading[] = [];
  const excluded: ExcludedReading[] = [];
  revision.readings.forEach((reading, i) => {
    const derived = revision.derived[i];
    if (!derived) return;
    const values = {
      row: i + 1,
      spread: reading.spread,
      plottingSpacingM: derived.plottingSpacingM,
      apparentResistivity: derived.apparentResistivityOhmM,
      relativeError: derived.relativeError,
    };
    if (reading.excluded === null) kept.push(values);
    else excluded.push({ ...values, reason: reading.excluded });
  });
  return { kept, excluded };
}

/** Readings as charts take them, in the order of the sheet; those left out stand among the kept. */
export function chartReadings({ kept, excluded }: CurveData): CurveReading[] {
  const reasons = new Map(excluded.map((reading) => [reading.row, reading.reason]));
  return [...kept, ...excluded]
    .toSorted((a, b) => a.row - b.row)
    .map((reading) => ({
      id: `row ${reading.row}`,
      spacing: reading.plottingSpacingM,
      label: spacingLabel(reading.spread),
      halfMN: halfMNOf(reading.spread),
      apparentResistivity: reading.apparentResistivity,
      relativeError: reading.relativeError,
      excluded: reasons.has(reading.row),
      reason: reasons.get(reading.row),
    }));
}

/** Values of the kept readings and then of those left out, laid over all in the sheet's order; null where none is known. */
export function overReadings({ kept, excluded }: CurveData, values: readonly number[]): (number | null)[] {
  return [...kept, ...excluded]
    .map(({ row }, i) => ({ row, value: values[i] ?? null }))
    .toSorted((a, b) => a.row - b.row)
    .map(({ value }) => value);
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

/** What the engine gives of a model beyond the readings that were fitted, Ω·m. */
export interface BeyondReadings {
  /** One a reading that was left out. */
  excluded: readonly number[];
  /** The curve between the readings; null where these lie dense enough to be joined. */
  points: readonly CurvePoint[] | null;
}

/** (ln predicted − ln measured)/σ of each reading that was left out; these took no part in the fit. */
export const residualsOf = (
  readings: readonly Pick<KeptReading, 'apparentResistivity' | 'relativeError'>[],
  predicted: readonly number[],
): number[] =>
  readings.map(
    ({ apparentResistivity, relativeError }, i) =>
      Math.log((predicted[i] ?? Number.NaN) / apparentResistivity) / relativeError,
  );

/** The curve of a finished run; null before it has one. Straight between the readings until `beyond` is known. */
export function lineOfRun(run: Run, beyond: BeyondReadings | null = null): CurveLine | null {
  if (!run.result) return null;
  const data = curveDataOfRun(run);
  const left = beyond?.excluded ?? [];
  return {
    id: run.id,
    kind: 'run',
    letter: letterOfRun(run),
    name: titleOfRun(run),
    points: beyond?.points ?? curvePoints(run.readings, run.result.predicted),
    predicted: overReadings(data, [...run.result.predicted, ...left]),
    residuals: overReadings(data, [...run.result.residuals, ...residualsOf(run.excluded, left)]),
  };
}

/** What the engine is asked for to draw a model whole: the readings left out, then the curve between the readings. */
export interface CurveRequest {
  excluded: readonly ExcludedReading[];
  places: readonly CurvePlace[];
}

export const curveRequest = ({ kept, excluded }: CurveData): CurveRequest => ({
  excluded,
  places: curvePlaces(kept.map((reading) => reading.spread)),
});

export const spreadsOf = ({ excluded, places }: CurveRequest): FitReading['spread'][] =>
  [...excluded, ...places].map(({ spread }) => spread);

/** The engine's answer to `spreadsOf`, Ω·m. What has no logarithm is not drawn. */
export function beyondOf({ excluded, places }: CurveRequest, predicted: readonly number[]): BeyondReadings {
  const points = places.flatMap(({ spacing, startsBranch }, i): CurvePoint[] => {
    const apparentResistivity = predicted[excluded.length + i] ?? 0;
    return apparentResistivity > 0 ? [{ spacing, apparentResistivity, startsBranch }] : [];
  });
  return { excluded: predicted.slice(0, excluded.length), points: points.length > 0 ? points : null };
}

export function columnOfRun(run: Run, bedNotes?: readonly (string | null)[]): GroundColumn | null {
  if (!run.result) return null;
  return {
    id: run.id,
    letter: letterOfRun(run),
    name: titleOfRun(run),
    earth: run.result.earth,
    intervals: run.result.intervals,
    isRejected: isRejected(run.result),
    isCells: hasCells(run.result),
    held: run.settings.fixed,
    bedNotes,
  };
}

/** A model by hand has no intervals: nothing was computed about its doubt. */
export function columnOfHand(
  earth: LayeredEarthModel,
  name: string,
  held: readonly HeldValue[],
): GroundColumn {
  return { id: 'hand', letter: '', name, earth, held };
}
