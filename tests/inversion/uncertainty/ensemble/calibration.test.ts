import { expect, it } from 'vitest';
import { createRandomStream } from '../../../../inversion';
import {
  answeredTargets,
  calibrationTrial,
  evenness,
  ranksOfTruth,
  reliability,
} from '../../../../inversion/reference/calibration-trials';
import { createGround } from '../../../../inversion/uncertainty/ensemble/ground';
import { unknownCountSpace } from '../../../../inversion/uncertainty/ensemble/ground-space';
import {
  createPopulation,
  putGround,
  type Population,
} from '../../../../inversion/uncertainty/ensemble/population';

/** `npm run calibrate` does the same over hundreds of trials of both samplers. */
it('ranks the truth evenly among samples, and answers target questions as often right as it says', () => {
  const random = createRandomStream(8);
  const trials = Array.from({ length: 30 }, (_, i) => calibrationTrial(2, 500 + i));
  const ranks = trials.map((trial) => ranksOfTruth(trial, random));
  for (let quantity = 0; quantity < 3; quantity++)
    expect(evenness(ranks.map((row) => row[quantity]!))).toBeGreaterThan(0.001);
  const answers = trials.flatMap((trial) => answeredTargets(trial, 40, random));
  const { count, mean, cameTrue } = reliability(answers, 0.05, 0.95);
  expect(count).toBeGreaterThan(60);
  expect(Math.abs(mean - cameTrue)).toBeLessThan(0.15);
});

it('ranks evenly what has few values', () => {
  const space = unknownCountSpace({ resistivity: [1, 100], thickness: [1, 10] });
  const random = createRandomStream(3);
  const ground = createGround(space.most);
  const draws = (size: number): Population => {
    const population = createPopulation(size, space.most);
    for (let i = 0; i < size; i++) {
      do space.draw(random, ground);
      while (ground.layers > 2);
      putGround(population, i, ground);
    }
    return population;
  };
  const counts = Array.from({ length: 300 }, (_, seed) => {
    const drawn = {
      chains: [draws(50), draws(50)],
      counts: [],
      thinning: 1,
      rHat: 1,
      effectiveSampleSize: 100,
    };
    const trial = { seed, model: { space, logLikelihood: () => 0 }, truth: draws(1), drawn };
    return ranksOfTruth(trial, random)[0]!;
  });
  expect(evenness(counts)).toBeGreaterThan(0.01);
});

it('tells uneven ranks from even ones', () => {
  const even = Array.from({ length: 300 }, (_, i) => i % 100);
  expect(evenness(even)).toBe(1);
  expect(evenness(even.map((rank) => (rank * rank) / 100))).toBeLessThan(1e-6);
});
