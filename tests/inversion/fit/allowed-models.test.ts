import { describe, expect, it } from 'vitest';
import { createForwardOperator, type Reading } from '../../../inversion';
import { allowedModels, standsApart, type FittedModel } from '../../../inversion/fit/allowed-models';
import { createResidualSystem } from '../../../inversion/fit/residual-system';

const spreads = [1, 2, 4, 8, 16, 32].map((spacing) => ({ type: 'wenner', spacing }) as const);
const predicted = createForwardOperator(spreads).predict({ resistivity: [100, 20], thickness: [4] });
const readings = spreads.map((spread, i): Reading => ({
  spread,
  apparentResistivity: predicted[i]!,
  relativeError: 0.03,
}));
const system = createResidualSystem(createForwardOperator(spreads), readings);
const HELD = [false, false, false];

const model = (rho1: number, rho2: number, h: number, chi2: number): FittedModel => ({
  parameters: Float64Array.from([rho1, rho2, h], Math.log),
  chi2,
});
const best = model(100, 20, 4, 3);

describe('allowedModels', () => {
  it('keeps the best first and the others by rising χ², below 1.96² above the least, each once', () => {
    const others = [
      model(100, 22, 4, 6),
      model(100, 40, 4, 3 + 3.85),
      model(101, 20.1, 4.02, 3.1),
      model(100, 25, 4, 3.5),
      model(100, 22.1, 4, 6.1),
    ];
    const found = allowedModels(best, others, system, 2, HELD, []);
    expect(found.map(({ earth }) => Math.round(earth.resistivity[1]!))).toEqual([20, 25, 22]);
    expect(found.map(({ excess }) => excess)).toEqual([0, 0.5, 3]);
  });

  it('gives a fixed value back as it was stated, in every model', () => {
    const fixed = [{ on: 'resistivity', index: 1, value: 20.000001 }] as const;
    const found = allowedModels(best, [model(100, 20, 5, 4)], system, 2, [false, true, false], fixed);
    expect(found.map(({ earth }) => earth.resistivity[1])).toEqual([20.000001, 20.000001]);
    expect(found[0].covariance.deviation[1]).toBe(0);
  });
});

describe('standsApart', () => {
  it('finds the first model outside of the intervals of the best alone, and none within', () => {
    const near = allowedModels(best, [model(100, 20.5, 4, 4)], system, 2, HELD, []);
    expect(standsApart(near)).toBeNull();
    const far = allowedModels(best, [model(100, 20.5, 4, 4), model(100, 60, 4, 5)], system, 2, HELD, []);
    expect(standsApart(far)!.earth.resistivity[1]).toBeCloseTo(60, 9);
  });
});
