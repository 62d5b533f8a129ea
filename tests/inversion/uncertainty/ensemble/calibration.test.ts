import { expect, it } from 'vitest';
import { createRandomStream } from '../../../../inversion';
import {
  answeredTargets,
  calibrationTrial,
  evenness,
  ranksOfTruth,
  reliability,
} from '../../../../inversion/reference/calibration-trials';

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

it('tells uneven ranks from even ones', () => {
  const even = Array.from({ length: 300 }, (_, i) => i % 100);
  expect(evenness(even)).toBe(1);
  expect(evenness(even.map((rank) => (rank * rank) / 100))).toBeLessThan(1e-6);
});
