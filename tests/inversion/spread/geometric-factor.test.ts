import { describe, expect, it } from 'vitest';
import { apparentResistivity, geometricFactor, InversionError, type Spread } from '../../../inversion';
import { forwardCases } from '../support/read-reference';
import { relativeError } from '../support/relative-error';

describe('geometricFactor', () => {
  it('is exact for a finite MN', () => {
    const k = geometricFactor({ type: 'schlumberger', halfAB: 10, halfMN: 2.5 });
    expect(k).toBeCloseTo((Math.PI * (100 - 6.25)) / 5, 10);
  });

  it('is twice the Schlumberger factor when B is at infinity', () => {
    const full = geometricFactor({ type: 'schlumberger', halfAB: 10, halfMN: 1 })!;
    expect(geometricFactor({ type: 'half-schlumberger', halfAB: 10, halfMN: 1 })).toBeCloseTo(2 * full, 10);
  });

  it.each<[string, Spread, number]>([
    ['Wenner 2πa', { type: 'wenner', spacing: 5 }, 10 * Math.PI],
    ['pole–pole 2πa', { type: 'pole-pole', spacing: 5 }, 10 * Math.PI],
    ['dipole–dipole πan(n+1)(n+2)', { type: 'dipole-dipole', dipole: 5, n: 3 }, 300 * Math.PI],
    ['Wenner as four electrodes', { type: 'electrodes', am: 5, an: 10, bm: 10, bn: 5 }, 10 * Math.PI],
    [
      'pole–pole as four electrodes',
      { type: 'electrodes', am: 5, an: null, bm: null, bn: null },
      10 * Math.PI,
    ],
  ])('%s', (_, spread, expected) => {
    expect(geometricFactor(spread)).toBeCloseTo(expected, 9);
  });

  it('keeps its sign: the field order A B M N of a dipole–dipole is negative, and ρa still comes out positive', () => {
    const fieldOrder: Spread = { type: 'electrodes', am: 20, an: 25, bm: 15, bn: 20 };
    expect(geometricFactor(fieldOrder)).toBeCloseTo(-300 * Math.PI, 8);
    expect(apparentResistivity(fieldOrder, -10, 50)).toBeCloseTo(60 * Math.PI, 8);
  });

  it('is null, and so is ρa, when MN was not recorded', () => {
    const spread: Spread = { type: 'schlumberger', halfAB: 10, halfMN: null };
    expect(geometricFactor(spread)).toBeNull();
    expect(apparentResistivity(spread, 10, 50)).toBeNull();
  });

  it('agrees with the independent set for five arrays', () => {
    const errors = forwardCases().flatMap((one) =>
      one.readings.map((r) =>
        relativeError(geometricFactor({ type: 'electrodes', am: r.AM, an: r.AN, bm: r.BM, bn: r.BN })!, r.K),
      ),
    );
    expect(errors).toHaveLength(384);
    expect(Math.max(...errors)).toBeLessThan(1e-11);
  });

  it('throws the fault of a spread that cannot be used', () => {
    const refused = () => geometricFactor({ type: 'schlumberger', halfAB: 5, halfMN: 5 });
    expect(refused).toThrow(InversionError);
    expect(refused).toThrow('halfMN is 5 m; it must be below halfAB (5 m)');
  });
});
