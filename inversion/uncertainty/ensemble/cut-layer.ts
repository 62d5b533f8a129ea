import { exp } from '../../math/exponential';
import { log } from '../../math/logarithm';
import type { RandomStream } from '../../random';
import type { Ground } from './ground';
import type { GroundSpace } from './ground-space';

/** What new layers are drawn from: ln ranges of resistivity and depth, and the counts that may be reached. */
export type MoveRange = Pick<GroundSpace, 'fewest' | 'most' | 'logResistivity' | 'logBoundary'>;

/** How lnρ of a new layer is drawn about that of the layer it is cut from: shares and standard deviations; the rest is even over the prior. */
const NEAR = [
  { share: 0.35, sigma: 0.25 },
  { share: 0.35, sigma: 1 },
] as const;
const EVEN_SHARE = 0.3;

/** Standard deviations of the ln contrast across a boundary that splits a layer; each as likely. */
const CONTRASTS = [0.25, 1, 2.5] as const;

const normalDensity = (x: number, sigma: number): number =>
  exp((-0.5 * x * x) / (sigma * sigma)) / (sigma * Math.sqrt(2 * Math.PI));

export function drawNewResistivity(
  { logResistivity: [low, high] }: MoveRange,
  beside: number,
  random: RandomStream,
): number {
  let left = random.uniform();
  for (const { share, sigma } of NEAR) {
    left -= share;
    if (left < 0) return beside + sigma * random.normal();
  }
  return low + (high - low) * random.uniform();
}

/** ln density of that draw for a value within the prior. */
export function logNewResistivity(
  { logResistivity: [low, high] }: MoveRange,
  value: number,
  beside: number,
): number {
  let density = EVEN_SHARE / (high - low);
  for (const { share, sigma } of NEAR) density += share * normalDensity(value - beside, sigma);
  return log(density);
}

/** lnρ above less lnρ below a boundary that splits a layer. */
export function drawContrast(random: RandomStream): number {
  return CONTRASTS[random.below(CONTRASTS.length)]! * random.normal();
}

/** ln density of that draw. */
export function logContrast(contrast: number): number {
  let density = 0;
  for (const sigma of CONTRASTS) density += normalDensity(contrast, sigma) / CONTRASTS.length;
  return log(density);
}

/** Share of a layer that lies above `depth`, all in ln depth, as far as the prior of boundaries reaches. */
export function shareAbove(
  { logBoundary: [low, high] }: MoveRange,
  { layers, values }: Ground,
  layer: number,
  depth: number,
): number {
  const top = layer === 0 ? low : values[layers + layer - 1]!;
  const base = layer === layers - 1 ? high : values[layers + layer]!;
  return (depth - top) / (base - top);
}
