import type { LayeredEarthModel } from '../../../server/contract/fit-settings';
import { boundaryDepths } from '../../charts/chart-data';

/** A value of the model; `index` counts beds from 0 at the surface. */
export interface ModelValue {
  on: 'resistivity' | 'thickness';
  index: number;
}

export const MAX_BEDS = 8;
const THICKNESS_LIMITS = [1e-3, 1e5] as const;
/** What a value by hand may be, Ω·m and m. */
export const HAND_LIMITS = { resistivity: [1e-3, 1e7], thickness: THICKNESS_LIMITS } as const;

const within = (value: number, [low, high]: readonly [number, number]) =>
  Math.min(high, Math.max(low, value));

export function withValue(
  earth: LayeredEarthModel,
  { on, index }: ModelValue,
  value: number,
): LayeredEarthModel {
  if (earth[on][index] === undefined || !(value > 0)) return earth;
  return { ...earth, [on]: earth[on].with(index, within(value, HAND_LIMITS[on])) };
}

/** Moves the base of bed `index` to a depth; the boundary below stays where it is unless it would be passed. */
export function withBoundary(earth: LayeredEarthModel, index: number, depthM: number): LayeredEarthModel {
  const bases = boundaryDepths(earth);
  const base = bases[index];
  if (base === undefined) return earth;
  const top = index === 0 ? 0 : (bases[index - 1] ?? 0);
  const below = bases[index + 1];
  const thinnest = Math.max(THICKNESS_LIMITS[0], base * 1e-3);
  const lowest = below === undefined ? top + THICKNESS_LIMITS[1] : below - thinnest;
  const depth = within(depthM, [Math.min(top + thinnest, lowest), lowest]);
  const thickness = earth.thickness.with(index, depth - top);
  return { ...earth, thickness: below === undefined ? thickness : thickness.with(index + 1, below - depth) };
}

/** The resistivity of bed `index` times a factor. */
export const withResistivityScaled = (
  earth: LayeredEarthModel,
  index: number,
  factor: number,
): LayeredEarthModel =>
  withValue(earth, { on: 'resistivity', index }, (earth.resistivity[index] ?? Number.NaN) * factor);

/** Cuts bed `index` in two of the same resistivity; the half-space is cut below its top by the depth above it. */
export function withBedSplit(earth: LayeredEarthModel, index: number): LayeredEarthModel {
  const resistivity = earth.resistivity[index];
  if (resistivity === undefined || earth.resistivity.length >= MAX_BEDS) return earth;
  const thickness = earth.thickness[index];
  const pieces =
    thickness === undefined ? [boundaryDepths(earth).at(-1) ?? 10] : [thickness / 2, thickness / 2];
  return {
    resistivity: earth.resistivity.toSpliced(index, 0, resistivity),
    thickness: earth.thickness.toSpliced(index, thickness === undefined ? 0 : 1, ...pieces),
  };
}

/** Takes bed `index` away; the bed below it (above it, for the lowest) grows into its place. */
export function withoutBed(earth: LayeredEarthModel, index: number): LayeredEarthModel {
  const count = earth.resistivity.length;
  if (count < 2 || index < 0 || index >= count) return earth;
  const resistivity = earth.resistivity.toSpliced(index, 1);
  const thickness = earth.thickness[index];
  if (thickness === undefined) return { resistivity, thickness: earth.thickness.slice(0, -1) };
  const joined = earth.thickness.toSpliced(index, 1);
  const next = joined[index];
  return { resistivity, thickness: next === undefined ? joined : joined.with(index, next + thickness) };
}

/** A plain model to begin by hand: the curve's own values at shallow, middle and wide spacing. */
export function modelFromCurve(
  readings: readonly { spacing: number; apparentResistivity: number }[],
): LayeredEarthModel | null {
  const sorted = readings.toSorted((a, b) => a.spacing - b.spacing);
  const [first, last] = [sorted[0], sorted.at(-1)];
  const middle = sorted[Math.floor(sorted.length / 2)];
  if (!first || !middle || !last) return null;
  if (sorted.length < 3) return { resistivity: [middle.apparentResistivity], thickness: [] };
  const upper = first.spacing;
  const lower = Math.max(middle.spacing * 0.7, upper * 1.5);
  return {
    resistivity: [first, middle, last].map((reading) => Number(reading.apparentResistivity.toPrecision(3))),
    thickness: [upper, lower - upper].map((length) => Number(length.toPrecision(2))),
  };
}

export function sameEarth(a: LayeredEarthModel, b: LayeredEarthModel): boolean {
  return (
    a.resistivity.length === b.resistivity.length &&
    a.resistivity.every((value, i) => value === b.resistivity[i]) &&
    a.thickness.every((value, i) => value === b.thickness[i])
  );
}
