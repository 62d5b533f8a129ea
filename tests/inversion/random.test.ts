import { expect, it } from 'vitest';
import { createRandomStream } from '../../inversion';

it('gives the same stream for the same seed and another for the next', () => {
  const draw = (seed: number) => {
    const stream = createRandomStream(seed);
    return Array.from({ length: 5 }, stream.uniform);
  };
  expect(draw(1)).toEqual(draw(1));
  expect(draw(4294967295)).toEqual(draw(4294967295));
  expect(draw(1)).not.toEqual(draw(2));
});

it('starts small seeds far apart', () => {
  const firsts = Array.from({ length: 64 }, (_, seed) => createRandomStream(seed).uniform());
  const mean = firsts.reduce((sum, x) => sum + x, 0) / firsts.length;
  expect(Math.abs(mean - 0.5)).toBeLessThan(0.12);
  expect(Math.min(...firsts)).toBeLessThan(0.15);
  expect(Math.max(...firsts)).toBeGreaterThan(0.85);
});

it('draws normal values of mean 0 and deviation 1, and whole numbers below a count', () => {
  const stream = createRandomStream(9);
  const values = Array.from({ length: 20_000 }, stream.normal);
  const mean = values.reduce((sum, x) => sum + x, 0) / values.length;
  const variance = values.reduce((sum, x) => sum + (x - mean) ** 2, 0) / values.length;
  expect(Math.abs(mean)).toBeLessThan(0.03);
  expect(Math.abs(variance - 1)).toBeLessThan(0.04);
  const drawn = new Set(Array.from({ length: 200 }, () => stream.below(4)));
  expect(drawn).toEqual(new Set([0, 1, 2, 3]));
});
