import { expect, it } from 'vitest';
import {
  compiledKernel,
  createForwardOperator,
  createOperatorCache,
  createRandomStream,
  fitLayered,
  type LayeredEarth,
  type Spread,
} from '../../../../inversion';
import { randomEarth, randomSpread } from '../../../../inversion/reference/random-cases';
import { layered } from '../../support/fit-settings';

const SPREADS = Array.from({ length: 9 }, (_, i): Spread => {
  const halfAB = 2 * 1.6 ** i;
  return { type: 'schlumberger', halfAB, halfMN: halfAB / 4 };
});

/** An earth of so many layers, each contrast at least twofold. */
function earthOf(layers: number): LayeredEarth {
  const random = createRandomStream(layers);
  return {
    resistivity: Array.from({ length: layers }, (_, i) => 10 ** (1 + (i % 3) + random.uniform())),
    thickness: Array.from({ length: layers - 1 }, () => 0.5 + 5 * random.uniform()),
  };
}

it('gives the bits of the plain kernel for every kind of spread, on both lattices', () => {
  const random = createRandomStream(21);
  const kernel = compiledKernel();
  for (let k = 0; k < 40; k++) {
    const spreads = Array.from({ length: 1 + (k % 11) }, (_, turn) => randomSpread(random, turn));
    const earth = randomEarth(random);
    const compiled = createForwardOperator(spreads, kernel);
    const plain = createForwardOperator(spreads);
    expect(compiled.predict(earth)).toEqual(plain.predict(earth));
    expect(compiled.predictWithJacobian(earth)).toEqual(plain.predictWithJacobian(earth));
    expect(compiled.quick().predict(earth)).toEqual(plain.quick().predict(earth));
    expect(compiled.quick().predictWithJacobian(earth)).toEqual(plain.quick().predictWithJacobian(earth));
  }
});

it('gives them for each count of layers, up and down again', () => {
  const compiled = createForwardOperator(SPREADS, compiledKernel());
  const plain = createForwardOperator(SPREADS);
  for (const layers of [1, 2, 3, 4, 5, 6, 7, 8, 40, 3, 1]) {
    const earth = earthOf(layers);
    expect(compiled.predictWithJacobian(earth)).toEqual(plain.predictWithJacobian(earth));
    expect(compiled.predict(earth)).toEqual(plain.predict(earth));
  }
});

it('gives them when its memory is full, and for a lattice beyond it', () => {
  const kernel = compiledKernel(2);
  const earth = earthOf(4);
  const pairs = [1, 2, 3, 4, 5, 6, 7, 40].map((times) => {
    const spreads = Array.from({ length: times }, () => SPREADS).flat();
    return [createForwardOperator(spreads, kernel), createForwardOperator(spreads)] as const;
  });
  for (let round = 0; round < 3; round++)
    for (const [compiled, plain] of pairs) {
      expect(compiled.predict(earth)).toEqual(plain.predict(earth));
      expect(compiled.predictWithJacobian(earth)).toEqual(plain.predictWithJacobian(earth));
    }
});

it('gives a fit its bits', () => {
  const readings = Array.from(createForwardOperator(SPREADS).predict(earthOf(3)), (value, i) => ({
    spread: SPREADS[i]!,
    apparentResistivity: value * (1 + 0.03 * Math.sin(7 * i)),
    relativeError: 0.03,
  }));
  const operators = createOperatorCache({ kernel: compiledKernel() });
  expect(fitLayered(readings, layered(3), { operators })).toEqual(fitLayered(readings, layered(3)));
});
