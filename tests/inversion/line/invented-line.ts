import {
  createForwardOperator,
  createRandomStream,
  type LayeredEarth,
  type LineSettings,
  type LineSounding,
  type Spread,
} from '../../../inversion';
import { layered } from '../support/fit-settings';

export const SPREADS: readonly Spread[] = [1.5, 2.5, 4, 6, 10, 15, 25, 40, 60, 100, 150, 250].map(
  (halfAB) => ({
    type: 'schlumberger',
    halfAB,
    halfMN: halfAB / 10,
  }),
);

/** Noisy readings over a ground that changes along a line: one sounding at each x. */
export function inventedLine(
  places: readonly number[],
  groundAt: (x: number) => LayeredEarth,
  { noise = 0.03, seed = 1, spreads = SPREADS } = {},
): LineSounding[] {
  const operator = createForwardOperator(spreads);
  const random = createRandomStream(seed);
  return places.map((x) => ({
    x,
    readings: Array.from(operator.predict(groundAt(x)), (value, i) => ({
      spread: spreads[i]!,
      apparentResistivity: value * Math.exp(noise * random.normal()),
      relativeError: noise,
    })),
  }));
}

export const everyMetres = (step: number, count: number): number[] =>
  Array.from({ length: count }, (_, i) => i * step);

/** Settings of a line with the default bounds and scales. */
export function alongLine(layers: LineSettings['layers'], more: Partial<LineSettings> = {}): LineSettings {
  const { targetMisfit: _unused, ...shared } = layered(layers);
  return { ...shared, kind: 'layered', lateral: { resistivity: 0.2, depth: 0.2 }, boreholes: [], ...more };
}
