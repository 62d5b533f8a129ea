import { exp } from '../math/exponential';
import { log } from '../math/logarithm';
import { plottingSpacing } from '../spread/plotting-spacing';
import type { RandomStream } from '../random';
import type { LayeredEarth, Reading } from '../types';

/** A sounding as a curve: ln spacing and ln ρa, ascending in spacing. */
export interface SoundingCurve {
  readonly logSpacing: Float64Array;
  readonly logResistivity: Float64Array;
}

/** Depth that a spacing speaks of, as a share of the spacing on the AB/2 axis. */
const LOG_DEPTH_SHARE = log(0.4);

export function soundingCurve(readings: readonly Reading[]): SoundingCurve {
  const points = readings
    .map((reading) => ({
      x: log(plottingSpacing(reading.spread)),
      y: log(reading.apparentResistivity),
    }))
    .sort((a, b) => a.x - b.x);
  return {
    logSpacing: Float64Array.from(points, (point) => point.x),
    logResistivity: Float64Array.from(points, (point) => point.y),
  };
}

/** ln ρa of the curve at a ln spacing, straight lines between readings, level beyond the ends. */
export function curveAt({ logSpacing, logResistivity }: SoundingCurve, x: number): number {
  const last = logSpacing.length - 1;
  if (x <= logSpacing[0]!) return logResistivity[0]!;
  if (x >= logSpacing[last]!) return logResistivity[last]!;
  let i = 1;
  while (logSpacing[i]! < x) i++;
  const x0 = logSpacing[i - 1]!;
  const x1 = logSpacing[i]!;
  if (x1 === x0) return logResistivity[i]!;
  const share = (x - x0) / (x1 - x0);
  return logResistivity[i - 1]! + share * (logResistivity[i]! - logResistivity[i - 1]!);
}

/** ln parameters with the given ln depths of the boundaries, ascending, and resistivities read off the curve. */
function modelFromDepths(curve: SoundingCurve, logDepths: Float64Array): Float64Array {
  const layers = logDepths.length + 1;
  const parameters = new Float64Array(2 * layers - 1);
  let above = 0;
  for (let i = 0; i < layers; i++) {
    const top = i === 0 ? (logDepths[0] ?? curve.logSpacing[0]!) - 1.4 : logDepths[i - 1]!;
    const bottom = i === layers - 1 ? top + 1.4 : logDepths[i]!;
    const spacing = (top + bottom) / 2 - LOG_DEPTH_SHARE;
    parameters[i] = curveAt(curve, spacing);
    if (i === layers - 1) break;
    const depth = exp(bottom);
    parameters[layers + i] = log(Math.max(depth - above, 0.05 * depth));
    above = depth;
  }
  return parameters;
}

/** ln parameters of a model with boundaries evenly spread in ln depth and resistivities read off the curve. */
export function evenStart(curve: SoundingCurve, layers: number): Float64Array {
  const { low, high } = depthRange(curve);
  const logDepths = new Float64Array(layers - 1);
  for (let i = 0; i < layers - 1; i++) logDepths[i] = low + ((high - low) * (i + 1)) / layers;
  return modelFromDepths(curve, logDepths);
}

/** The same, with the mean of the curve for every resistivity: a model that says least. */
export function moderateStart(curve: SoundingCurve, layers: number): Float64Array {
  const { logResistivity } = curve;
  const mean = logResistivity.reduce((sum, value) => sum + value, 0) / logResistivity.length;
  return evenStart(curve, layers).fill(mean, 0, layers);
}

/** ln parameters of an earth. */
export function logEarth({ resistivity, thickness }: LayeredEarth): Float64Array {
  return Float64Array.from([...resistivity, ...thickness], log);
}

function depthRange({ logSpacing }: SoundingCurve): { low: number; high: number } {
  return {
    low: logSpacing[0]! + LOG_DEPTH_SHARE - 0.4,
    high: logSpacing[logSpacing.length - 1]! + LOG_DEPTH_SHARE + 0.4,
  };
}

/** The same with boundaries uniform in ln depth and resistivities scattered about the curve. */
export function randomStart(curve: SoundingCurve, layers: number, random: RandomStream): Float64Array {
  const { low, high } = depthRange(curve);
  const logDepths = new Float64Array(layers - 1);
  for (let i = 0; i < layers - 1; i++) {
    const depth = low + (high - low) * random.uniform();
    let place = i;
    for (; place > 0 && logDepths[place - 1]! > depth; place--) logDepths[place] = logDepths[place - 1]!;
    logDepths[place] = depth;
  }
  const parameters = modelFromDepths(curve, logDepths);
  for (let i = 0; i < layers; i++) parameters[i]! += 0.6 * random.normal();
  return parameters;
}

/** This many times the longest spacing lies below what a reading tells of. */
const BEYOND_REACH = 10;
/** Factors by which the two halves of a split layer are told apart, in ln ρ. */
const SPLIT_CONTRASTS = [0.5, -0.5] as const;

/**
 * Models with one layer more than `parameters` (2N − 1 ln values): each layer in turn halved, its halves told apart both
 * ways. The half-space is split at twice the deepest boundary.
 */
export function splitStarts(parameters: Float64Array, curve: SoundingCurve): Float64Array[] {
  const layers = (parameters.length + 1) / 2;
  return Array.from({ length: layers }, (_, i) => i).flatMap((i) =>
    SPLIT_CONTRASTS.map((contrast) => splitLayer(parameters, curve, i, contrast)),
  );
}

/** The same ground with its half-space split in two alike, at twice the deepest boundary. */
export const splitHalfSpace = (parameters: Float64Array, curve: SoundingCurve): Float64Array =>
  splitLayer(parameters, curve, (parameters.length - 1) / 2, 0);

/**
 * The same ground with one layer more: each layer in turn split in two alike, the half-space at twice the deepest boundary and,
 * last, far below what the readings reach.
 */
export function sameWithOneMore(parameters: Float64Array, curve: SoundingCurve): Float64Array[] {
  const layers = (parameters.length + 1) / 2;
  const split = Array.from({ length: layers }, (_, i) => splitLayer(parameters, curve, i, 0));
  const beyond = split.at(-1)!.slice();
  beyond[2 * layers] = curve.logSpacing.at(-1)! + log(BEYOND_REACH);
  return [...split, beyond];
}

function splitLayer(
  parameters: Float64Array,
  curve: SoundingCurve,
  i: number,
  contrast: number,
): Float64Array {
  const layers = (parameters.length + 1) / 2;
  const rho = Array.from(parameters.subarray(0, layers));
  const thickness = Array.from(parameters.subarray(layers));
  const depth = thickness.reduce((sum, h) => sum + exp(h), 0);
  const below = depth > 0 ? log(depth) : (depthRange(curve).low + depthRange(curve).high) / 2;
  const halves = i < layers - 1 ? [thickness[i]! - Math.LN2, thickness[i]! - Math.LN2] : [below];
  return Float64Array.from([
    ...rho.toSpliced(i, 1, rho[i]! + contrast, rho[i]! - contrast),
    ...thickness.toSpliced(i, 1, ...halves),
  ]);
}
