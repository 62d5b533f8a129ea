import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  createOperatorCache,
  createRandomStream,
  InversionError,
  type LayeredEarth,
  type Spread,
} from '../../../inversion';
import { integratedApparentResistivity } from '../../../inversion/reference/direct-integration';
import { randomEarth, randomSpread } from '../../../inversion/reference/random-cases';
import { forwardCases, referenceRows } from '../support/read-reference';
import { median, relativeError } from '../support/relative-error';

describe('createForwardOperator', () => {
  it('agrees with the independent set: worst ≤ 1e-8, median ≤ 1e-12, of 384', () => {
    const errors = forwardCases().flatMap((one) => {
      const spreads = one.readings.map(
        (r) => ({ type: 'electrodes', am: r.AM, an: r.AN, bm: r.BM, bn: r.BN }) as const,
      );
      const earth = { resistivity: one.rho, thickness: one.thickness };
      const predicted = createForwardOperator(spreads).predict(earth);
      return one.readings.map((r, i) => relativeError(predicted[i]!, r.rhoa));
    });
    expect(errors).toHaveLength(384);
    expect(Math.max(...errors)).toBeLessThan(1e-8);
    expect(median(errors)).toBeLessThan(1e-12);
  });

  it(
    'agrees with direct integration on 200 random earths of every kind of spread',
    { timeout: 60_000 },
    () => {
      const random = createRandomStream(2024);
      const errors = Array.from({ length: 200 }, (_, turn) => {
        const earth = randomEarth(random);
        const spread = randomSpread(random, turn);
        const slow = integratedApparentResistivity(spread, earth);
        return relativeError(createForwardOperator([spread]).predict(earth)[0]!, slow);
      });
      expect(Math.max(...errors)).toBeLessThan(1e-8);
      expect(median(errors)).toBeLessThan(1e-12);
    },
  );

  it('gives a spread the same answer alone and in a list that spans 0.1 to 5000 m', () => {
    const spreads: Spread[] = [
      { type: 'wenner', spacing: 0.1 },
      { type: 'schlumberger', halfAB: 5000, halfMN: 50 },
      { type: 'dipole-dipole', dipole: 20, n: 10 },
      { type: 'pole-pole', spacing: 300 },
      { type: 'electrodes', am: 0.1, an: 40, bm: 900, bn: 5000 },
    ];
    const earth = { resistivity: [50, 5, 400, 20], thickness: [0.5, 8, 120] };
    const together = createForwardOperator(spreads).predict(earth);
    spreads.forEach((spread, i) => {
      const alone = createForwardOperator([spread]).predict(earth)[0]!;
      expect(relativeError(together[i]!, alone)).toBeLessThan(1e-12);
    });
  });

  it('gives ρ of a uniform ground for every spread', () => {
    const random = createRandomStream(5);
    const spreads = Array.from({ length: 30 }, (_, turn) => randomSpread(random, turn));
    const predicted = createForwardOperator(spreads).predict({ resistivity: [73], thickness: [] });
    predicted.forEach((value) => expect(relativeError(value, 73)).toBeLessThan(1e-10));
  });

  it('stays within 1e-6 of direct integration up to a contrast of 10⁹', () => {
    const earth = { resistivity: [1, 1e9], thickness: [1] };
    for (const size of [20, 200]) {
      const spreads: Spread[] = [
        { type: 'schlumberger', halfAB: size, halfMN: size / 5 },
        { type: 'wenner', spacing: size },
        { type: 'pole-pole', spacing: size },
        { type: 'dipole-dipole', dipole: size / 5, n: 5 },
      ];
      const predicted = createForwardOperator(spreads).predict(earth);
      spreads.forEach((spread, i) =>
        expect(relativeError(predicted[i]!, integratedApparentResistivity(spread, earth))).toBeLessThan(1e-6),
      );
    }
  });

  it('agrees with the two-layer ordinates of Wenner, gradient Schlumberger and pole–pole', () => {
    const columns: [string, (x: number) => Spread][] = [
      ['wenner_ra_over_r1', (spacing) => ({ type: 'wenner', spacing })],
      ['schlumberger_ideal_ra_over_r1', (halfAB) => ({ type: 'schlumberger', halfAB, halfMN: null })],
      ['polepole_ra_over_r1', (spacing) => ({ type: 'pole-pole', spacing })],
    ];
    const rows = referenceRows('two-layer-ordinates.csv').filter((row) => Math.abs(Number(row.k)) < 1);
    expect(rows.length).toBeGreaterThan(300);
    for (const row of rows) {
      const x = Number(row.x_spacing_over_h);
      const earth = { resistivity: [1, Number(row.rho2_over_rho1)], thickness: [1] };
      const predicted = createForwardOperator(columns.map(([, spread]) => spread(x))).predict(earth);
      columns.forEach(([name], i) =>
        expect(Math.abs(predicted[i]! - Number(row[name]))).toBeLessThan(2e-9 * Math.max(1, predicted[i]!)),
      );
    }
  });

  it('agrees with the multi-layer ordinates, gradient and exact MN', () => {
    const rows = referenceRows('multi-layer-ordinates.csv');
    expect(rows.length).toBeGreaterThan(50);
    for (const row of rows) {
      const x = Number(row.spacing_m);
      const list = (text: string) => text.split('/').map(Number);
      const predicted = createForwardOperator([
        { type: 'schlumberger', halfAB: x, halfMN: null },
        { type: 'schlumberger', halfAB: x, halfMN: x / 5 },
        { type: 'wenner', spacing: x },
      ]).predict({ resistivity: list(row.rho!), thickness: list(row.h!) });
      const expected = [
        row.schlumberger_ideal,
        row.schlumberger_exactK_MN_eq_AB_over_5,
        row.wenner_a_eq_spacing,
      ].map(Number);
      expected.forEach((value, i) => expect(relativeError(predicted[i]!, value)).toBeLessThan(1e-8));
    }
  });

  it('has an analytic Jacobian that agrees with a ladder of central differences to 1e-6', () => {
    const spreads = Array.from({ length: 12 }, (_, turn) =>
      randomSpread(createRandomStream(turn + 40), turn),
    );
    const earth = { resistivity: [100, 8, 900, 40], thickness: [1.5, 6, 30] };
    const operator = createForwardOperator(spreads);
    const { predicted, jacobian } = operator.predictWithJacobian(earth);
    const parameters = [...earth.resistivity, ...earth.thickness];
    const unpack = (values: number[]): LayeredEarth => ({
      resistivity: values.slice(0, 4),
      thickness: values.slice(4),
    });
    parameters.forEach((value, j) => {
      const gaps = [1e-2, 1e-3, 1e-4, 1e-5].map((step) => {
        const up = operator.predict(unpack(parameters.with(j, value * Math.exp(step))));
        const down = operator.predict(unpack(parameters.with(j, value * Math.exp(-step))));
        return Math.max(
          ...spreads.map((_, i) => {
            const slope = (up[i]! - down[i]!) / (2 * step);
            return Math.abs(slope - jacobian[i * 7 + j]!) / Math.abs(predicted[i]!);
          }),
        );
      });
      expect(Math.min(...gaps)).toBeLessThan(1e-6);
    });
    expect(predicted).toEqual(operator.predict(earth));
  });

  it('refuses a spread with its place in the list, and an earth of the wrong shape', () => {
    const refused = () =>
      createForwardOperator([
        { type: 'wenner', spacing: 1 },
        { type: 'schlumberger', halfAB: 1, halfMN: 2 },
      ]);
    expect(refused).toThrow(InversionError);
    expect(refused).toThrow(
      expect.objectContaining({ code: 'spread-halfmn', path: ['spreads', 1, 'halfMN'] }),
    );
    const operator = createForwardOperator([{ type: 'wenner', spacing: 1 }]);
    expect(() => operator.predict({ resistivity: [1, 2], thickness: [] })).toThrow(
      'thickness has 0 entries; it must have 1',
    );
    expect(() => operator.predict({ resistivity: [1, -2], thickness: [1] })).toThrow(
      'resistivity 2 is -2; it must be a number above 0',
    );
  });
});

describe('createOperatorCache', () => {
  const wenner = (spacing: number): Spread[] => [{ type: 'wenner', spacing }];

  it('keeps the most recently asked-for operators, with the same bits as new ones', () => {
    const cache = createOperatorCache({ limit: 2 });
    const first = cache.operatorFor(wenner(1));
    cache.operatorFor(wenner(2));
    expect(cache.operatorFor(wenner(1))).toBe(first);
    cache.operatorFor(wenner(3));
    expect(cache.operatorFor(wenner(1))).toBe(first);
    const earth = { resistivity: [10, 100], thickness: [3] };
    expect(first.predict(earth)).toEqual(createForwardOperator(wenner(1)).predict(earth));
  });

  it('lets the least recently asked-for one go', () => {
    const cache = createOperatorCache({ limit: 1 });
    const first = cache.operatorFor(wenner(1));
    cache.operatorFor(wenner(2));
    expect(cache.operatorFor(wenner(1))).not.toBe(first);
  });
});
