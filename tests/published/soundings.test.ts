import { describe, expect, it } from 'vitest';
import { createForwardOperator, describeDoubt, fitLayered, type Reading } from '../../inversion';
import { layered } from '../inversion/support/fit-settings';
import { publishedReadings, publishedRows } from './read-published';

/** rms of predicted/read − 1 in %. */
function rmsPercent(readings: readonly Reading[], resistivity: number[], thickness: number[]): number {
  const predicted = createForwardOperator(readings.map((r) => r.spread)).predict({ resistivity, thickness });
  const squares = readings.map((r, i) => (predicted[i]! / r.apparentResistivity - 1) ** 2);
  return 100 * Math.sqrt(squares.reduce((sum, x) => sum + x, 0) / squares.length);
}

describe('university exercise, a conductive layer under 29 Ω·m (F. Fès, TP 2020–21; seen)', () => {
  it('as Wenner the base lies at 124.8 m: 28.65 over 3.71 Ω·m, 3.0 %', () => {
    const fit = fitLayered(publishedReadings('conductive-base-wenner.csv', 0.05), layered(2));
    expect(fit.earth.resistivity[0]).toBeCloseTo(28.65, 1);
    expect(fit.earth.resistivity[1]).toBeCloseTo(3.71, 1);
    expect(fit.earth.thickness[0]).toBeCloseTo(124.8, 0);
    expect(fit.rmsPercent).toBeCloseTo(3, 1);
  });

  it('as Schlumberger it lies at 91.5 m: 28.26 over 4.09 Ω·m, 2.7 %; the array decides the depth', () => {
    const fit = fitLayered(publishedReadings('conductive-base-schlumberger.csv', 0.05), layered(2));
    expect(fit.earth.resistivity[0]).toBeCloseTo(28.26, 1);
    expect(fit.earth.resistivity[1]).toBeCloseTo(4.09, 1);
    expect(fit.earth.thickness[0]).toBeCloseTo(91.5, 0);
    expect(fit.rmsPercent).toBeCloseTo(2.7, 1);
  });
});

describe('road exercise, Schlumberger (seen)', () => {
  it('the 7 m reading rises with slope 2.06 on log–log axes, and no layered earth follows it', () => {
    const rows = publishedRows('road-schlumberger.csv');
    const slopes = rows.slice(1).map((row, i) => {
      const before = rows[i]!;
      return (
        Math.log(row['rhoa (ohm m)']! / before['rhoa (ohm m)']!) /
        Math.log(row['AB/2 (m)']! / before['AB/2 (m)']!)
      );
    });
    expect(Math.max(...slopes)).toBeCloseTo(2.06, 2);
    const readings = publishedReadings('road-schlumberger.csv', 0.03);
    const all = fitLayered(readings, layered(4));
    expect(all.misfitProbability).toBeLessThan(1e-6);
    const worst = all.residuals.reduce(
      (far, r, i) => (Math.abs(r) > Math.abs(all.residuals[far]!) ? i : far),
      0,
    );
    expect(readings[worst]!.spread).toMatchObject({ halfAB: 7 });
  });
});

describe('K-type Wenner curve worked by a graphical method (seen; recomputed)', () => {
  const readings = publishedReadings('graphical-k-type-wenner.csv', 0.03);

  it('the graphical model misfits its own data by rms 58 %, or 39 % if 4.53 m is a depth', () => {
    expect(rmsPercent(readings, [8300, 42_003, 3062], [0.8, 4.53])).toBeCloseTo(58, 0);
    expect(Math.floor(rmsPercent(readings, [8300, 42_003, 3062], [0.8, 3.73]))).toBe(39);
  });

  it('least squares reaches 0.3 % with ρ₁ ≈ 9950 and ρ₃ ≈ 3660, and only T₂ ≈ 7.4–8.1e4 Ω·m² is resolved', () => {
    const fit = fitLayered(readings, layered(3));
    expect(fit.rmsPercent).toBeLessThan(0.32);
    expect(fit.earth.resistivity[0]! / 9950).toBeCloseTo(1, 1);
    expect(fit.earth.resistivity[2]! / 3660).toBeCloseTo(1, 2);
    expect(fit.darZarrouk.resistanceOhmM2[1]).toBeGreaterThan(7.4e4);
    expect(fit.darZarrouk.resistanceOhmM2[1]).toBeLessThan(8.1e4);
    const item = describeDoubt(fit).find((doubt) => doubt.bed === 1)!;
    expect(item).toMatchObject({ kind: 'resistance', unit: 'Ω·m²' });
    expect(item.factor).toBeLessThan(1.35);
  });
});

describe('utility design manual, two Wenner traverses (seen)', () => {
  it.each([
    ['utility-traverse-1.csv', 131],
    ['utility-traverse-2.csv', 131],
  ])('%s: with 5 %% errors one layer of about %d Ω·m is enough', (name, resistivity) => {
    const fit = fitLayered(publishedReadings(name, 0.05), layered('auto'));
    expect(fit.earth.resistivity).toHaveLength(1);
    expect(Math.abs(fit.earth.resistivity[0]! / resistivity - 1)).toBeLessThan(0.02);
    expect(fit.layerCounts!.find((count) => count.chosen)!.withinNoise).toBe(true);
  });
});
