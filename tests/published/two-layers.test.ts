import { describe, expect, it } from 'vitest';
import { createForwardOperator, fitLayered } from '../../inversion';
import { layered } from '../inversion/support/fit-settings';
import { publishedReadings, publishedRows } from './read-published';

describe('two-layer limits and examples', () => {
  it('an insulator below: Schlumberger → ρ₁L/h, Wenner → 1.38629 ρ₁a/h far out (Tagg 1964, Koefoed 1979; from memory)', () => {
    const [schlumberger, wenner] = createForwardOperator([
      { type: 'schlumberger', halfAB: 2000, halfMN: null },
      { type: 'wenner', spacing: 2000 },
    ]).predict({ resistivity: [1, 1e9], thickness: [1] });
    expect(schlumberger! / 2000).toBeCloseTo(1, 3);
    expect(wenner! / 2000).toBeCloseTo(1.38629, 3);
  });

  it('IEEE Std 80 worked example: 100 over 300 Ω·m, ρa/ρ₁ = 2 at 19 m puts the base at 6.06 m, not the 7.0 m of the chart (from memory; computed)', () => {
    const ratio = (thickness: number) =>
      createForwardOperator([{ type: 'wenner', spacing: 19 }]).predict({
        resistivity: [100, 300],
        thickness: [thickness],
      })[0]! / 100;
    expect(ratio(19 / 3.1351)).toBeCloseTo(2, 4);
    expect(ratio(7)).toBeLessThan(1.95);
  });

  it('earthing literature: the set is the rounded curve of 700/180 Ω·m over 2.5 m (from memory; recomputed)', () => {
    const rows = publishedRows('earthing-two-layer-b.csv');
    const curve = createForwardOperator(
      rows.map((row) => ({ type: 'wenner', spacing: row['a (m)']! }) as const),
    ).predict({ resistivity: [700, 180], thickness: [2.5] });
    rows.forEach((row, i) => expect(Math.abs(curve[i]! - row['rhoa (ohm m)']!)).toBeLessThan(0.6));
    const fit = fitLayered(publishedReadings('earthing-two-layer-b.csv', 0.03), layered(2));
    expect(fit.earth.resistivity[0]! / 700).toBeCloseTo(1, 2);
    expect(fit.earth.resistivity[1]! / 180).toBeCloseTo(1, 2);
    expect(fit.earth.thickness[0]! / 2.5).toBeCloseTo(1, 2);
  });

  it('earthing literature: relative least squares gives 372.7/145.3 Ω·m over 2.69 m, beside 383.5/147.7/2.56 published (from memory; re-fitted)', () => {
    const fit = fitLayered(publishedReadings('earthing-two-layer-a.csv', 0.03), layered(2));
    expect(fit.earth.resistivity[0]! / 372.7).toBeCloseTo(1, 2);
    expect(fit.earth.resistivity[1]! / 145.3).toBeCloseTo(1, 2);
    expect(fit.earth.thickness[0]! / 2.69).toBeCloseTo(1, 2);
  });
});
