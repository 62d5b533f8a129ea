import * as fc from 'fast-check';
import { expect, test } from 'vitest';
import { placeLabels } from '../../../src/charts/place-labels';

test('labels with room stay where they wish', () => {
  const wishes = [
    { y: 20, height: 10 },
    { y: 60, height: 10 },
  ];
  expect(placeLabels(wishes, 0, 100)).toEqual([20, 60]);
});

test('two in one place stand evenly about it', () => {
  const wishes = [
    { y: 50, height: 10 },
    { y: 50, height: 10 },
  ];
  expect(placeLabels(wishes, 0, 100)).toEqual([45, 55]);
});

test('never overlap and never leave the drawing while there is room', () => {
  const wish = fc.record({
    y: fc.double({ min: -20, max: 520, noNaN: true }),
    height: fc.integer({ min: 8, max: 40 }),
  });
  fc.assert(
    fc.property(fc.array(wish, { maxLength: 10 }), (wishes) => {
      const middles = placeLabels(wishes, 0, 500);
      const placed = wishes
        .map(({ y, height }, i) => ({
          wish: y,
          top: middles[i]! - height / 2,
          base: middles[i]! + height / 2,
        }))
        .toSorted((a, b) => a.top - b.top);
      const overlaps = placed.slice(1).map((label, i) => placed[i]!.base - label.top);
      const swaps = placed.slice(1).map((label, i) => placed[i]!.wish - label.wish);
      expect(Math.max(0, ...overlaps)).toBeLessThan(1e-6);
      expect(Math.max(0, ...swaps)).toBe(0);
      expect(Math.min(0, ...placed.map((label) => label.top))).toBeGreaterThan(-1e-6);
      expect(Math.max(500, ...placed.map((label) => label.base))).toBeLessThan(500 + 1e-6);
    }),
  );
});
