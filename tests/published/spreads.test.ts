import { describe, expect, it } from 'vitest';
import {
  apparentResistivity,
  createForwardOperator,
  effectiveDepth,
  geometricFactor,
  type Spread,
} from '../../inversion';
import { publishedRows } from './read-published';

const FOOT = 0.3048;

describe('geometric factors', () => {
  it.each(
    publishedRows('schlumberger-k-column.csv').map((row) => [
      row['AB/2 (m)']!,
      row['MN/2 (m)']!,
      row['K (m)']!,
    ]),
  )('AB/2 %d, MN/2 %d → %d (printed field sheet, seen)', (halfAB, halfMN, printed) => {
    const k = geometricFactor({ type: 'schlumberger', halfAB, halfMN })!;
    expect(Math.abs(k - printed)).toBeLessThan(0.0501);
  });

  it('Wenner beta 6πa, gamma 3πa (from memory)', () => {
    // beta C C P P: A and B beside each other; gamma C P C P
    expect(geometricFactor({ type: 'electrodes', am: 4, an: 6, bm: 2, bn: 4 })).toBeCloseTo(-12 * Math.PI, 9);
    expect(geometricFactor({ type: 'electrodes', am: 2, an: 6, bm: 2, bn: 2 })).toBeCloseTo(6 * Math.PI, 9);
  });

  it('R_α = R_β + R_γ on any earth (from memory)', () => {
    const alpha: Spread = { type: 'electrodes', am: 2, an: 4, bm: 4, bn: 2 };
    const beta: Spread = { type: 'electrodes', am: 4, an: 6, bm: 2, bn: 4 };
    const gamma: Spread = { type: 'electrodes', am: 2, an: 6, bm: 2, bn: 2 };
    const spreads = [alpha, beta, gamma];
    const predicted = createForwardOperator(spreads).predict({
      resistivity: [80, 7, 300],
      thickness: [1, 3],
    });
    const [ra, rb, rg] = spreads.map((spread, i) => Math.abs(predicted[i]! / geometricFactor(spread)!));
    expect(rb! + rg!).toBeCloseTo(ra!, 10);
  });

  it('ASTM G57: ρ[Ω·cm] = 191.5 a R with a in feet (seen)', () => {
    const rho = 100 * apparentResistivity({ type: 'wenner', spacing: 7 * FOOT }, 3, 1)!;
    expect(rho / (191.5 * 7 * 3)).toBeCloseTo(1, 3);
  });

  it('ASTM G57, unequal pins: 95.76 b R/(1 − b/(a + b)), the same as π c(c + d)/d (seen)', () => {
    const [inner, outer] = [4 * FOOT, 10 * FOOT];
    const spread: Spread = { type: 'schlumberger', halfAB: outer + inner / 2, halfMN: inner / 2 };
    expect(geometricFactor(spread)).toBeCloseTo((Math.PI * outer * (outer + inner)) / inner, 9);
    const printed = (95.76 * 10) / (1 - 10 / 14);
    expect((100 * geometricFactor(spread)!) / printed).toBeCloseTo(1, 3);
  });

  it('MIL-HDBK-419A: R = 2 Ω at 20 ft → 7662 Ω·cm with 2π ≈ 6.28 and 610 cm (seen)', () => {
    const rho = 100 * apparentResistivity({ type: 'wenner', spacing: 20 * FOOT }, 2, 1)!;
    expect(Math.abs(rho / 7662 - 1)).toBeLessThan(5e-4);
  });

  it('CSIR-NET 2014: R = 4, 3, 1 Ω at 25, 50, 75 m → 628, 942, 471 Ω·m (seen)', () => {
    const found = publishedRows('k-curve-three-points.csv').map((row) =>
      Math.round(apparentResistivity({ type: 'wenner', spacing: row['a (m)']! }, row['R (ohm)']!, 1)!),
    );
    expect(found).toEqual([628, 942, 471]);
  });

  it('a solved paper prints 94.20 where its own R gives 56.55 (seen, recomputed)', () => {
    const rows = publishedRows('printed-misprint-wenner.csv');
    const wrong = rows.flatMap((row) => {
      const rho = apparentResistivity({ type: 'wenner', spacing: row['a (m)']! }, row['R (ohm)']!, 1)!;
      return Math.abs(rho / row['rhoa (ohm m)']! - 1) > 0.01 ? [[row['a (m)'], Number(rho.toFixed(2))]] : [];
    });
    expect(wrong).toEqual([[15, 56.55]]);
  });

  it('the gradient shortcut πL²/MN errs 1.01 % at MN/AB = 1/10 and 4.17 % at 1/5 (computed)', () => {
    const error = (ratio: number) => {
      const exact = geometricFactor({ type: 'schlumberger', halfAB: 10, halfMN: 10 * ratio })!;
      return 100 * ((Math.PI * 100) / (20 * ratio) / exact - 1);
    };
    expect(error(0.1)).toBeCloseTo(1.01, 2);
    expect(error(0.2)).toBeCloseTo(4.17, 2);
  });
});

describe('median depth of investigation (Edwards 1977; from memory, recomputed)', () => {
  it.each<[string, Spread, number]>([
    ['Wenner 0.519 a', { type: 'wenner', spacing: 1 }, 0.519],
    ['Schlumberger 0.383 AB/2', { type: 'schlumberger', halfAB: 1, halfMN: null }, 0.383],
    ['pole–pole 0.866 a', { type: 'pole-pole', spacing: 1 }, 0.866],
    ['dipole–dipole n = 1', { type: 'dipole-dipole', dipole: 1, n: 1 }, 0.416],
    ['dipole–dipole n = 2', { type: 'dipole-dipole', dipole: 1, n: 2 }, 0.697],
    ['dipole–dipole n = 3', { type: 'dipole-dipole', dipole: 1, n: 3 }, 0.962],
    ['dipole–dipole n = 4', { type: 'dipole-dipole', dipole: 1, n: 4 }, 1.22],
    ['dipole–dipole n = 5', { type: 'dipole-dipole', dipole: 1, n: 5 }, 1.476],
    ['dipole–dipole n = 6', { type: 'dipole-dipole', dipole: 1, n: 6 }, 1.73],
  ])('%s', (_, spread, depth) => {
    expect(Math.abs(effectiveDepth(spread) - depth)).toBeLessThan(6e-4);
  });
});

describe('four pins 18 inches apart, the current through 14.6 Ω (common practice)', () => {
  /** mS/m from the voltage over the resistor and the voltage between the inner pins. */
  const conductivity = (resistorV: number, innerV: number) =>
    1000 / apparentResistivity({ type: 'wenner', spacing: 18 * 0.0254 }, innerV, resistorV / 14.6)!;

  it('conducts about 24 mS/m × the ratio of the two voltages', () => {
    expect(conductivity(1, 1)).toBeCloseTo(23.84, 2);
    expect(conductivity(0.5, 2)).toBeCloseTo(23.84 / 4, 2);
  });

  it('reads 3 to 30 mS/m, as ground commonly has, at ratios of about 1/8 to 5/4, and sea water at 210', () => {
    expect(conductivity(1, 8)).toBeCloseTo(3, 1);
    expect(Math.abs(conductivity(1.26, 1) - 30)).toBeLessThan(0.1);
    expect(Math.abs(conductivity(210, 1) / 5000 - 1)).toBeLessThan(0.01);
  });
});
