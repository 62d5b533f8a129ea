import type { CheckedReading } from './reading-check';
import { log } from '../math/logarithm';

/** One spacing of one branch; repeats are one point. */
export interface CurvePoint {
  readonly readings: readonly CheckedReading[];
  /** ln spacing, spacing in m on the common axis */
  readonly x: number;
  /** mean ln ρa, ρa in Ω·m */
  readonly y: number;
  /** standard error of one reading here (not of the mean), in ln ρa */
  readonly error: number;
}

/** Readings taken without moving M and N (or, for dipoles, with one dipole length), by growing spacing. */
export interface CurveBranch {
  readonly halfMN: number | null;
  readonly points: readonly CurvePoint[];
}

const mean = (values: readonly number[]): number =>
  values.reduce((sum, value) => sum + value, 0) / values.length;

function branchKey({ reading: { spread } }: CheckedReading): string {
  if ('halfMN' in spread) return `${spread.type} ${String(spread.halfMN)}`;
  return spread.type === 'dipole-dipole' ? `${spread.type} ${spread.dipole}` : spread.type;
}

function groupBy<K>(
  readings: readonly CheckedReading[],
  key: (reading: CheckedReading) => K,
): CheckedReading[][] {
  const groups = new Map<K, CheckedReading[]>();
  for (const reading of readings) {
    const group = groups.get(key(reading));
    if (group) group.push(reading);
    else groups.set(key(reading), [reading]);
  }
  return [...groups.values()];
}

/** Readings whose lengths are all equal, in order of first appearance. */
export const sameSpread = (readings: readonly CheckedReading[]): CheckedReading[][] =>
  groupBy(readings, ({ reading: { spread } }) => JSON.stringify(Object.values(spread)));

function pointOf(readings: readonly CheckedReading[]): CurvePoint {
  return {
    readings,
    x: log(readings[0]?.derived.plottingSpacingM ?? 1),
    y: mean(readings.map(({ derived }) => log(derived.apparentResistivityOhmM))),
    error: mean(readings.map(({ derived }) => derived.relativeError)),
  };
}

/** The branches of a sounding, each by growing spacing, the shallowest branch first. */
export function curveBranches(readings: readonly CheckedReading[]): CurveBranch[] {
  return groupBy(readings, branchKey)
    .map((branch) => {
      const spread = branch[0]?.reading.spread;
      const points = sameSpread(branch)
        .map(pointOf)
        .toSorted((a, b) => a.x - b.x);
      return { halfMN: spread && 'halfMN' in spread ? spread.halfMN : null, points };
    })
    .toSorted((a, b) => (a.points[0]?.x ?? 0) - (b.points[0]?.x ?? 0));
}

export const rowsOf = (...points: readonly CurvePoint[]): number[] =>
  points.flatMap(({ readings }) => readings.map(({ row }) => row)).toSorted((a, b) => a - b);
