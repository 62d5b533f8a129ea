import { expect, it } from 'vitest';
import { createForwardOperator, createRandomStream, fitLayered, type Reading } from '../../../inversion';
import { layered } from '../support/fit-settings';
import { trialSounding } from '../support/trial-soundings';

it('covers the truth in about 95 % of noisy soundings of a well-resolved ground', { timeout: 60_000 }, () => {
  const truth = { resistivity: [100, 20], thickness: [4] };
  const spreads = Array.from({ length: 15 }, (_, i) => ({ type: 'wenner', spacing: 1.4 ** i }) as const);
  const clean = createForwardOperator(spreads).predict(truth);
  const random = createRandomStream(77);
  const inside = [0, 0, 0];
  const trials = 150;
  for (let t = 0; t < trials; t++) {
    const readings = spreads.map((spread, i): Reading => ({
      spread,
      apparentResistivity: clean[i]! * Math.exp(0.03 * random.normal()),
      relativeError: 0.03,
    }));
    const { intervals } = fitLayered(readings, layered(2));
    const all = [...intervals.resistivity, ...intervals.thickness];
    [100, 20, 4].forEach((value, j) => {
      const [low, high] = all[j]!;
      if ((low ?? 0) <= value && value <= (high ?? Infinity)) inside[j]! += 1;
    });
  }
  // three standard errors of a share of 0.95 in 150 trials are 0.053
  inside.forEach((count) => {
    expect(count / trials).toBeGreaterThan(0.89);
    expect(count).toBeLessThan(trials);
  });
});

it(
  'covers the truth in 92 to 98 % of the values that it calls known, where other grounds fit alike too',
  { timeout: 120_000 },
  () => {
    const random = createRandomStream(19);
    let known = 0;
    let covered = 0;
    for (let t = 0; t < 150; t++) {
      const { truth, readings } = trialSounding(random, t);
      const { intervals, factors } = fitLayered(readings, layered(truth.resistivity.length));
      for (const on of ['resistivity', 'thickness'] as const)
        truth[on].forEach((value, i) => {
          const factor = factors[on][i]!;
          if (factor === null || factor >= 1.5) return;
          const [low, high] = intervals[on][i]!;
          known += 1;
          if ((low ?? 0) <= value && value <= (high ?? Infinity)) covered += 1;
        });
    }
    expect(known).toBeGreaterThan(300);
    expect(covered / known).toBeGreaterThan(0.92);
    expect(covered / known).toBeLessThan(0.98);
  },
);
