import {
  createForwardOperator,
  createRandomStream,
  fitEarth,
  fitLine,
  geometricFactor,
  type FitSettings,
  type Reading,
  type Spread,
} from '../../../inversion';
import { sampleEnsemble } from '../../../inversion/uncertainty/ensemble/sample-ensemble';
import { layered } from './fit-settings';

const SPREADS: Spread[] = [
  ...Array.from({ length: 14 }, (_, i): Spread => {
    const halfAB = 1.5 * 1.5 ** i;
    return { type: 'schlumberger', halfAB, halfMN: halfAB / 5 };
  }),
  { type: 'wenner', spacing: 7 },
  { type: 'half-schlumberger', halfAB: 30, halfMN: 2 },
  { type: 'pole-pole', spacing: 12 },
  { type: 'dipole-dipole', dipole: 5, n: 4 },
  { type: 'electrodes', am: 3, an: 9, bm: 40, bn: null },
];
const GROUND = { resistivity: [120, 15, 400], thickness: [2.5, 9] };

function readings(seed: number, from: readonly Spread[] = SPREADS.slice(0, 14)): Reading[] {
  const random = createRandomStream(seed);
  return Array.from(createForwardOperator(from).predict(GROUND), (value, i) => ({
    spread: from[i]!,
    apparentResistivity: value * (1 + 0.03 * random.normal()),
    relativeError: 0.03,
    branch: i < 7 ? 'a' : 'b',
  }));
}

const fit = (more: Partial<FitSettings>) => fitEarth(readings(1), layered(3, more));

/** Small inputs of every kind through the engine; Node and browser must find the same bits, and none may move unnoticed. */
export const GOLDEN_CASES: Record<string, () => unknown> = {
  forward: () => {
    const operator = createForwardOperator(SPREADS);
    const { predicted, jacobian } = operator.predictWithJacobian(GROUND);
    return [SPREADS.map(geometricFactor), Array.from(predicted), Array.from(jacobian)];
  },
  random: () => {
    const random = createRandomStream(9);
    return Array.from({ length: 50 }, () => [random.uniform(), random.normal(), random.below(99)]);
  },
  layered: () => fit({}),
  'layered, all spreads': () => fitEarth(readings(2, SPREADS), layered(4)),
  'layered, auto': () => fit({ layers: 'auto' }),
  'layered, with a prior, shifts and outliers': () =>
    fit({
      priors: [{ on: 'depth', index: 0, value: 2.4, sigma: 0.2 }],
      branchShiftSigma: 0.1,
      outlierTolerant: true,
    }),
  smooth: () => fit({ kind: 'smooth', layers: 'auto' }),
  stepped: () => fit({ kind: 'stepped', layers: 'auto' }),
  line: () =>
    fitLine(
      [3, 4, 5].map((seed, k) => ({ x: 50 * k, readings: readings(seed) })),
      { ...layered(3), kind: 'layered', lateral: { resistivity: 0.2, depth: 0.2 }, boreholes: [] },
    ),
  samples: () =>
    sampleEnsemble(readings(1), {
      layers: 3,
      prior: { resistivity: [1, 1e4], thickness: [0.2, 200] },
      draws: 500,
      seed: 4,
    }),
};

/** The results as text, every double with all its digits; the name of the engine apart. */
export const goldenText = (name: string): string =>
  JSON.stringify(GOLDEN_CASES[name]!(), (key, value: unknown) => (key === 'engine' ? undefined : value));
