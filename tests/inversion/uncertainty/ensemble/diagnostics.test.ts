import { expect, it } from 'vitest';
import { createRandomStream } from '../../../../inversion';
import {
  bulkEffectiveSize,
  effectiveSize,
  rankRHat,
} from '../../../../inversion/uncertainty/ensemble/diagnostics';
import { normalQuantile } from '../../../../inversion/uncertainty/ensemble/normal-quantile';

/** Four chains x ← ax + noise, the last one shifted. */
function chains(a: number, shift = 0, length = 4000): Float64Array[] {
  const random = createRandomStream(5);
  return Array.from({ length: 4 }, (_, c) => {
    let x = random.normal();
    return Float64Array.from({ length }, () => {
      x = a * x + Math.sqrt(1 - a * a) * random.normal();
      return x + (c === 3 ? shift : 0);
    });
  });
}

it.each([
  // printed tables of the normal distribution, to their digits
  [0.5, 0],
  [0.975, 1.959963984540054],
  [0.05, -1.6448536269514722],
  [0.999, 3.090232306167813],
  [1e-6, -4.753424308822899],
])('the normal quantile of %f is %f', (p, z) => {
  expect(normalQuantile(p)).toBeCloseTo(z, 12);
});

it('gives chains of a known correlation their worth: (1 − a)/(1 + a) of the samples', () => {
  for (const a of [0, 0.5, 0.9]) {
    const expected = (16_000 * (1 - a)) / (1 + a);
    expect(effectiveSize(chains(a)) / expected).toBeGreaterThan(0.85);
    expect(effectiveSize(chains(a)) / expected).toBeLessThan(1.15);
  }
});

it('sees a chain that stands elsewhere, one that is wider, and one that drifts', () => {
  expect(rankRHat(chains(0.5))).toBeLessThan(1.005);
  expect(rankRHat(chains(0.5, 1))).toBeGreaterThan(1.05);
  const wider = chains(0).map((chain, c) => (c === 0 ? chain.map((x) => 4 * x) : chain));
  expect(rankRHat(wider)).toBeGreaterThan(1.05);
  const drifting = chains(0).map((chain) => chain.map((x, i) => x + i / 2000));
  expect(rankRHat(drifting)).toBeGreaterThan(1.05);
});

it('judges by ranks: a tail without a variance changes nothing', () => {
  const heavy = chains(0.5).map((chain) => chain.map((x) => Math.exp(x * x * x)));
  expect(rankRHat(heavy)).toBeCloseTo(rankRHat(chains(0.5)), 2);
  expect(bulkEffectiveSize(heavy)).toBeCloseTo(bulkEffectiveSize(chains(0.5)), 0);
});

it('takes what never changes as known', () => {
  const still = chains(0).map((chain) => chain.fill(3));
  expect(rankRHat(still)).toBe(1);
  expect(effectiveSize(still)).toBe(16_000);
});
