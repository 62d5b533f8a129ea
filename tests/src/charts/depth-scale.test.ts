import { describe, expect, test } from 'vitest';
import { depthScale } from '../../../src/charts/depth-scale';

const extent = { minDepth: 0.5, maxDepth: 60 };

describe.each(['linear', 'log'] as const)('%s depth scale', (kind) => {
  const scale = depthScale(kind, extent, 480);

  test('depth points down and runs to the foot', () => {
    expect(scale.yOf(60)).toBeCloseTo(480, 9);
    expect(scale.yOf(0)).toBe(0);
    expect(scale.yOf(10)).toBeLessThan(scale.yOf(20));
    expect(scale.yOf(1000)).toBeCloseTo(480, 9);
  });

  test('depthAt undoes yOf', () => {
    for (const depth of [0.6, 3, 12.5, 59]) expect(scale.depthAt(scale.yOf(depth))).toBeCloseTo(depth, 9);
  });

  test('ticks do not collide', () => {
    scale.ticks.slice(1).forEach((tick, i) => expect(tick.y - scale.ticks[i]!.y).toBeGreaterThan(15));
  });
});

test('even ticks are round and start at the surface', () => {
  expect(depthScale('linear', extent, 480).ticks.map((tick) => tick.label)).toEqual([
    '0',
    '10',
    '20',
    '30',
    '40',
    '50',
    '60',
  ]);
});

test('log ticks stand at 1, 2 and 5', () => {
  expect(depthScale('log', extent, 480).ticks.map((tick) => tick.depth)).toEqual([0.5, 1, 2, 5, 10, 20, 50]);
});
