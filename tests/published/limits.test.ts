import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  darZarrouk,
  fitLayered,
  type LayeredEarth,
  type Spread,
} from '../../inversion';
import { layered } from '../inversion/support/fit-settings';

const SPACINGS = Array.from({ length: 61 }, (_, i) => 10 ** (i / 20));
const wenner = (spacing: number): Spread => ({ type: 'wenner', spacing });
const gradient = (halfAB: number): Spread => ({ type: 'schlumberger', halfAB, halfMN: null });

function curve(spread: (x: number) => Spread, earth: LayeredEarth): Float64Array {
  return createForwardOperator(SPACINGS.map(spread)).predict(earth);
}

/** Largest move between two curves, %. */
function largestMove(spread: (x: number) => Spread, a: LayeredEarth, b: LayeredEarth): number {
  const [first, second] = [curve(spread, a), curve(spread, b)];
  return Math.max(...Array.from(first, (value, i) => 100 * Math.abs(second[i]! / value - 1)));
}

function slopes(spread: (x: number) => Spread, earth: LayeredEarth): number[] {
  const values = curve(spread, earth);
  return Array.from(values.subarray(1), (value, i) => Math.log(value / values[i]!) / (Math.LN10 / 20));
}

describe('equivalence (computed)', () => {
  const h = { resistivity: [100, 10, 1000], thickness: [5, 5] };
  const k = { resistivity: [50, 1000, 10], thickness: [5, 5] };

  it('H 100/10/1000: half the thickness at half the resistivity moves the curve by 2.8 % (Wenner), 3.1 % (Schlumberger)', () => {
    const other = { resistivity: [100, 5, 1000], thickness: [5, 2.5] };
    expect(largestMove(wenner, h, other)).toBeCloseTo(2.8, 1);
    expect(largestMove(gradient, h, other)).toBeCloseTo(3.1, 1);
  });

  it('K 50/1000/10: half the thickness at twice the resistivity moves the curve by 1.0 % and 1.1 %', () => {
    const other = { resistivity: [50, 2000, 10], thickness: [5, 2.5] };
    expect(largestMove(wenner, k, other)).toBeCloseTo(1, 1);
    expect(largestMove(gradient, k, other)).toBeCloseTo(1.1, 1);
  });
});

describe('suppression (computed)', () => {
  it.each([
    [1, 0.01],
    [2, 0.05],
    [3, 0.11],
    [5, 0.3],
    [10, 1],
  ])(
    'a middle layer of %d m between 10 and 100 Ω·m is matched by two layers to rms %d %%',
    (thickness, rms) => {
      const spreads = SPACINGS.filter((_, i) => i % 3 === 0).map(gradient);
      const predicted = createForwardOperator(spreads).predict({
        resistivity: [10, 31.6, 100],
        thickness: [10, thickness],
      });
      const readings = spreads.map((spread, i) => ({
        spread,
        apparentResistivity: predicted[i]!,
        relativeError: 0.01,
      }));
      const fit = fitLayered(readings, layered(2));
      expect(fit.rmsPercent).toBeGreaterThan(0.7 * rms);
      expect(fit.rmsPercent).toBeLessThan(1.3 * rms);
    },
  );
});

describe('slopes of layered curves on log–log axes (computed)', () => {
  const insulator = { resistivity: [1, 1e6], thickness: [3] };

  it.each<[string, (x: number) => Spread]>([
    ['Wenner', wenner],
    ['Schlumberger', gradient],
    ['pole–pole', (spacing) => ({ type: 'pole-pole', spacing })],
  ])('%s never rises faster than +1', (_, spread) => {
    const steepest = Math.max(...slopes(spread, insulator));
    expect(steepest).toBeLessThan(1.001);
    expect(steepest).toBeGreaterThan(0.9);
  });

  it('falls as fast as −4.0 over a hundred times better conductor (Schlumberger)', () => {
    const steepest = Math.min(...slopes(gradient, { resistivity: [100, 1], thickness: [3] }));
    expect(Math.abs(steepest + 4)).toBeLessThan(0.1);
  });
});

describe('Dar Zarrouk quantities', () => {
  it('10 Ω·m × 5 m over 50 Ω·m × 10 m: S 0.7 S, T 550 Ω·m², anisotropy 1.308 (GATE Geophysics 2016, seen)', () => {
    const found = darZarrouk({ resistivity: [10, 50, 100], thickness: [5, 10] });
    expect(found.totalConductanceS).toBeCloseTo(0.7, 10);
    expect(found.totalResistanceOhmM2).toBeCloseTo(550, 10);
    expect(found.anisotropy).toBeCloseTo(1.30809, 5);
  });

  it('100/10 Ω·m × 10/20 m: S 2.1, T 1200, λ 1.6733 (computed)', () => {
    const found = darZarrouk({ resistivity: [100, 10, 1], thickness: [10, 20] });
    expect(found.totalConductanceS).toBeCloseTo(2.1, 10);
    expect(found.totalResistanceOhmM2).toBeCloseTo(1200, 10);
    expect(found.anisotropy).toBeCloseTo(1.6733, 4);
  });
});
