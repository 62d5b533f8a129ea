import {
  createForwardOperator,
  createRandomStream,
  type FitSettings,
  type LayeredEarth,
  type Reading,
  type Spread,
} from '../../../inversion';
import { layered } from './fit-settings';

/** Settings of a smooth or stepped fit with the default bounds. */
export function cells(kind: 'smooth' | 'stepped', more: Partial<FitSettings> = {}): FitSettings {
  return { ...layered('auto'), kind, ...more };
}

/** Readings of an earth with Gaussian noise of `noise` in ln ρa, seeded. */
export function soundingOf(
  earth: LayeredEarth,
  spreads: readonly Spread[],
  noise = 0,
  relativeError = 0.03,
): Reading[] {
  const random = createRandomStream(77);
  return Array.from(createForwardOperator(spreads).predict(earth), (value, i) => ({
    spread: spreads[i]!,
    apparentResistivity: value * Math.exp(noise * random.normal()),
    relativeError,
  }));
}

export const SCHLUMBERGER = Array.from({ length: 24 }, (_, i): Spread => ({
  type: 'schlumberger',
  halfAB: 1.3 ** i,
  halfMN: 0.2 * 1.3 ** i,
}));

/** ρ of a ground at a depth in m. */
export function resistivityAt({ resistivity, thickness }: LayeredEarth, depth: number): number {
  let base = 0;
  const layer = thickness.findIndex((h) => (base += h) > depth);
  return resistivity.at(layer)!;
}
