import { expect, it } from 'vitest';
import { drawPosterior } from '../../../../inversion/uncertainty/ensemble/draw-posterior';
import { statedCountSpace, unknownCountSpace } from '../../../../inversion/uncertainty/ensemble/ground-space';
import type { LogLikelihood } from '../../../../inversion/uncertainty/ensemble/likelihood';
import type { Model } from '../../../../inversion/uncertainty/ensemble/metropolis';

const PRIOR = { resistivity: [1, 1e4], thickness: [0.2, 200] } as const;

/** ln L, far below 0, of lnρ₁ about `mean`, and of the layer count: each layer more is e^`perLayer` times as likely. */
const bell =
  (mean: number, sigma: number, perLayer = 0): LogLikelihood =>
  ({ values, layers }) =>
    -0.5 * ((values[0]! - mean) / sigma) ** 2 + perLayer * layers - 60;

/** Mean and standard deviation of lnρ₁, and the share of each count. */
function summary(model: Model): { mean: number; sigma: number; counts: number[] } {
  const { chains } = drawPosterior(model, { draws: 16_000, seed: 3, report: () => undefined });
  const first = chains.flatMap(({ values, stride, size }) =>
    Array.from({ length: size }, (_, i) => values[i * stride]!),
  );
  const mean = first.reduce((sum, x) => sum + x, 0) / first.length;
  const square = first.reduce((sum, x) => sum + (x - mean) ** 2, 0) / first.length;
  const counts = Array.from({ length: 8 }, () => 0);
  for (const { layers } of chains) for (const count of layers) counts[count - 1]! += 1 / first.length;
  return { mean, sigma: Math.sqrt(square), counts };
}

// the quick likelihood is shifted, wider and blind to the count: the exact one alone must show
it.each([
  ['stated', statedCountSpace(PRIOR, 2)],
  ['unknown', unknownCountSpace(PRIOR)],
] as const)('samples the exact likelihood, however far off the quick one is: count %s', (_, space) => {
  const exact = bell(4.3, 0.5, 0.3);
  const { mean, sigma, counts } = summary({ space, logLikelihood: bell(4, 0.6), logExact: exact });
  expect(Math.abs(mean - 4.3)).toBeLessThan(0.04);
  expect(Math.abs(sigma - 0.5)).toBeLessThan(0.03);
  if (space.fewest === space.most) return;
  const total = counts.reduce((sum, _share, k) => sum + Math.exp(0.3 * (k + 1)), 0);
  counts.forEach((share, k) => expect(Math.abs(share - Math.exp(0.3 * (k + 1)) / total)).toBeLessThan(0.025));
});

it('finds both of two narrow peaks of unlike counts, in their shares', () => {
  // ρ₁ near e² with one to four layers, or near e⁷ with five to eight, the latter three times as likely
  const logLikelihood: LogLikelihood = (ground) =>
    ground.layers <= 4 ? bell(2, 0.1)(ground) : bell(7, 0.1)(ground) + Math.log(3);
  const { counts } = summary({ space: unknownCountSpace(PRIOR), logLikelihood });
  const few = counts.slice(0, 4).reduce((sum, share) => sum + share, 0);
  expect(Math.abs(few - 0.25)).toBeLessThan(0.03);
});
