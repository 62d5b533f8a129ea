import { describe, expect, it } from 'vitest';
import { effectiveDepth, plottingSpacing, type Spread } from '../../../inversion';

describe('effectiveDepth', () => {
  it('scales with the spread', () => {
    const one = effectiveDepth({ type: 'dipole-dipole', dipole: 1, n: 4 });
    expect(effectiveDepth({ type: 'dipole-dipole', dipole: 250, n: 4 })).toBeCloseTo(250 * one, 8);
  });

  it('does not depend on the order of the pairs', () => {
    const a = effectiveDepth({ type: 'electrodes', am: 20, an: 25, bm: 15, bn: 20 });
    expect(effectiveDepth({ type: 'dipole-dipole', dipole: 5, n: 3 })).toBeCloseTo(a, 10);
  });

  it('is √3/2 of the spacing for pole–pole, in closed form', () => {
    expect(effectiveDepth({ type: 'pole-pole', spacing: 2 })).toBeCloseTo(Math.sqrt(3), 12);
  });
});

describe('plottingSpacing', () => {
  it.each<[Spread, number]>([
    [{ type: 'schlumberger', halfAB: 40, halfMN: 5 }, 40],
    [{ type: 'half-schlumberger', halfAB: 40, halfMN: null }, 40],
    [{ type: 'wenner', spacing: 10 }, 15],
  ])('%j stands at %d m', (spread, expected) => {
    expect(plottingSpacing(spread)).toBe(expected);
  });

  it('puts an ideal Schlumberger spread given as four electrodes at its AB/2', () => {
    const thin = plottingSpacing({ type: 'electrodes', am: 39.99, an: 40.01, bm: 40.01, bn: 39.99 });
    expect(thin).toBeCloseTo(40, 4);
  });

  it('gives the other spreads the AB/2 of the same effective depth', () => {
    expect(plottingSpacing({ type: 'pole-pole', spacing: 10 })).toBeCloseTo(8.660254 / 0.3832105, 3);
  });
});
