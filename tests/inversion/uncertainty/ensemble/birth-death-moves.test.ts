import { expect, it } from 'vitest';
import { createRandomStream } from '../../../../inversion';
import { birthMove, deathMove } from '../../../../inversion/uncertainty/ensemble/birth-death-moves';
import { createGround } from '../../../../inversion/uncertainty/ensemble/ground';
import { MOST_COUNT, unknownCountSpace } from '../../../../inversion/uncertainty/ensemble/ground-space';
import { metropolisStep, type Model } from '../../../../inversion/uncertainty/ensemble/metropolis';

const LOG_RANGE = [-2, 3] as const;
const PRIOR = {
  resistivity: LOG_RANGE.map(Math.exp) as [number, number],
  thickness: LOG_RANGE.map(Math.exp) as [number, number],
};
const STEPS = 400_000;

/** ln L ≤ 0, so that exact draws are those of the prior, each kept with chance L. */
const likelihoods: Record<string, Model['logLikelihood']> = {
  'no likelihood': () => 0,
  'a likelihood of top and half-space': ({ values, layers }) =>
    -0.5 * (values[0]! + values[layers - 1]!) ** 2 - 0.5 * (values[0]! - values[layers - 1]!) ** 2,
};

/** Mean over the samples of: each count, lnρ of top and half-space, their squares, the ln depth of the first boundary. */
function features(
  visit: (see: (ground: { layers: number; values: Float64Array }) => number) => void,
): number[] {
  const sums = Array.from({ length: MOST_COUNT + 5 }, () => 0);
  let total = 0;
  visit(({ layers, values }) => {
    total++;
    sums[layers - 1]!++;
    const [top, bottom] = [values[0]!, values[layers - 1]!];
    [top, bottom, top * top, bottom * bottom, layers > 1 ? values[layers]! : 0].forEach(
      (value, k) => (sums[MOST_COUNT + k]! += value),
    );
    return total;
  });
  return sums.map((sum) => sum / total);
}

it.each(Object.keys(likelihoods))('births and deaths alone keep prior × likelihood: %s', (name) => {
  const space = unknownCountSpace(PRIOR);
  const model = { space, logLikelihood: likelihoods[name]! };
  const moves = [birthMove(space, 1), deathMove(space, 1)];
  const random = createRandomStream(11);
  const [ground, trial] = [createGround(MOST_COUNT), createGround(MOST_COUNT)];
  const walked = features((see) => {
    space.draw(random, ground);
    ground.logPrior = space.logPrior(ground);
    ground.logLikelihood = model.logLikelihood(ground);
    for (let i = 0; i < STEPS; i++) {
      metropolisStep(model, moves[random.below(2)]!, 1, ground, trial, random);
      see(ground);
    }
  });
  const expected = features((see) => {
    for (let i = 0; i < STEPS; i++) {
      do space.draw(random, trial);
      while (Math.log(random.uniform()) > model.logLikelihood(trial));
      see(trial);
    }
  });
  walked.forEach((value, k) =>
    expect(Math.abs(value - expected[k]!), `feature ${k}`).toBeLessThan(k < 8 ? 0.008 : 0.04),
  );
});

it('a death can take back every birth, at the opposite ratio', () => {
  const space = unknownCountSpace(PRIOR);
  const [birth, death] = [birthMove(space, 1), deathMove(space, 1)];
  const random = createRandomStream(5);
  const [ground, born, back] = [createGround(MOST_COUNT), createGround(MOST_COUNT), createGround(MOST_COUNT)];
  const isGround = () =>
    ground.values.subarray(0, 2 * ground.layers - 1).every((x, j) => Math.abs(x - back.values[j]!) < 1e-12);
  for (let i = 0; i < 200; i++) {
    do space.draw(random, ground);
    while (ground.layers === MOST_COUNT);
    const ratio = birth.propose(ground, born, random);
    const reverse = Array.from({ length: 400 }, () => {
      const one = death.propose(born, back, random);
      return isGround() ? one : NaN;
    }).find(Number.isFinite);
    expect(reverse).toBeCloseTo(-ratio, 9);
  }
});
