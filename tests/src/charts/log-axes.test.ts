import { describe, expect, test } from 'vitest';
import { labelledTicks, logTicks, squareLogAxes, tickLabel } from '../../../src/charts/log-axes';

const xs = [1.5, 10, 100, 370];
const ys = [139, 40, 75, 13];

describe('squareLogAxes', () => {
  test.each([
    [900, 300],
    [300, 500],
    [2000, 400],
  ])('a decade is as long in x as in y in a box of %d × %d', (width, height) => {
    const { x, y, pixelsPerDecade } = squareLogAxes(xs, ys, width, height);
    expect(width / (x.max - x.min)).toBeCloseTo(pixelsPerDecade, 9);
    expect(height / (y.max - y.min)).toBeCloseTo(pixelsPerDecade, 9);
  });

  test('all data lie inside with a margin', () => {
    const { x, y } = squareLogAxes(xs, ys, 900, 300);
    expect(x.min).toBeLessThan(Math.log10(1.5) - 0.1);
    expect(x.max).toBeGreaterThan(Math.log10(370) + 0.1);
    expect(y.min).toBeLessThan(Math.log10(13) - 0.1);
    expect(y.max).toBeGreaterThan(Math.log10(139) + 0.1);
  });

  test('one reading, or none, still gives axes', () => {
    const { x, pixelsPerDecade } = squareLogAxes([10], [100], 800, 400);
    expect(pixelsPerDecade).toBeLessThanOrEqual(340);
    expect((x.min + x.max) / 2).toBeCloseTo(1, 9);
    expect(squareLogAxes([], [], 800, 400).x.max).toBeGreaterThan(0);
  });

  test('values that have no logarithm are passed over', () => {
    expect(squareLogAxes([0, -5, 10], [100, 100, Number.NaN], 800, 400).x.min).toBeGreaterThan(-1.5);
  });
});

test('ticks stand at 1, 2 and 5 of each decade, ends included', () => {
  const ticks = logTicks({ min: 0, max: 2 });
  expect(ticks.map((tick) => tick.value)).toEqual([1, 2, 5, 10, 20, 50, 100]);
  expect(ticks.filter((tick) => tick.isDecade).map((tick) => tick.value)).toEqual([1, 10, 100]);
});

test('where numbers would collide only whole decades are numbered', () => {
  const range = { min: 0, max: 2 };
  expect(labelledTicks(range, 99, 30).map((tick) => tick.value)).toEqual([1, 10, 100]);
  expect(labelledTicks(range, 100, 30)).toHaveLength(7);
});

test.each([
  [Math.log10(0.5), '0.5'],
  [Math.log10(20), '20'],
  [3, '1000'],
  [4, '10\u202f000'],
  [-2, '0.01'],
])('tick at 10^%d reads %s', (position, label) => expect(tickLabel(position)).toBe(label));
