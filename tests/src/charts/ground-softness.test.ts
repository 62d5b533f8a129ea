import { describe, expect, test } from 'vitest';
import type { Bounds, GroundColumn } from '../../../src/charts/chart-data';
import { depthScale } from '../../../src/charts/depth-scale';
import { colorBehind, profileStops, shareBelow, softBoundaries } from '../../../src/charts/ground-softness';
import { contrastRatio } from '../../../src/charts/oklab';
import { rampColor, textColorOn } from '../../../src/charts/resistivity-ramp';

const columnOf = (resistivity: number[], thickness: number[], depth: Bounds[]): GroundColumn => ({
  id: 'a',
  letter: 'A',
  name: '',
  earth: { resistivity, thickness },
  intervals: { resistivity: [], depth },
});
const scale = depthScale('linear', { minDepth: 1, maxDepth: 40 }, 400);
const OPEN: Bounds = [null, null];

describe('shareBelow', () => {
  const boundary = { y: 10, top: 5, base: 20 };
  test.each([
    [4, 0],
    [5, 0],
    [7.5, 0.25],
    [10, 0.5],
    [15, 0.75],
    [20, 1],
    [30, 1],
  ])('at %d the ground has turned by %d', (y, share) => {
    expect(shareBelow(y, boundary)).toBeCloseTo(share, 12);
  });

  test('a boundary without doubt is a step', () => {
    const sharp = { y: 10, top: 10, base: 10 };
    expect([9.99, 10, 10.01].map((y) => shareBelow(y, sharp))).toEqual([0, 1, 1]);
  });
});

describe('softBoundaries', () => {
  test('a boundary is as soft as its interval', () => {
    expect(softBoundaries(columnOf([100, 1], [10], [[6, 18]]), scale)).toEqual([
      { top: 60, y: 100, base: 180 },
    ]);
  });

  test('a boundary that nothing limits leaves half of an outer bed and the core of an inner one', () => {
    const [first, second] = softBoundaries(columnOf([100, 1, 100], [10, 10], [OPEN, OPEN]), scale);
    expect(first).toEqual({ top: 50, y: 100, base: 135 });
    expect(second).toEqual({ top: 165, y: 200, base: 300 });
  });

  test('a thin bed tints its neighbours no further than twice its height', () => {
    const [first, second] = softBoundaries(columnOf([112, 0.12, 112], [10, 0.2], [OPEN, OPEN]), scale);
    expect(first!.y - first!.top).toBeCloseTo(4, 9);
    expect(second!.base - second!.y).toBeCloseTo(4, 9);
  });
});

describe('profileStops', () => {
  const column = columnOf([100, 1], [10], [[5, 20]]);
  const colorsOf = (of: GroundColumn) =>
    new Map(profileStops(of, scale, 40).map((stop) => [Math.round(stop.offset * 4000) / 100, stop.color]));

  test('the colour turns over the stretch of the boundary, half way at its best value', () => {
    const colors = colorsOf(column);
    expect(colors.get(5)).toBe(rampColor(100));
    expect(colors.get(10)).toBe(rampColor(10));
    expect(colors.get(20)).toBe(rampColor(1));
  });

  test('a boundary without doubt has its own colour on either side', () => {
    const stops = profileStops({ ...column, intervals: null }, scale, 3);
    expect(stops.map((stop) => stop.color)).toEqual(
      [100, 100, 1, 1, 1, 1].map((resistivity) => rampColor(resistivity)),
    );
  });

  test('the core of thick beds keeps its colour over an unlimited thin one', () => {
    const colors = colorsOf(columnOf([112, 0.12, 112], [10, 0.02], [OPEN, OPEN]));
    for (const depth of [0, 5, 9, 11, 20, 40]) expect(colors.get(depth)).toBe(rampColor(112));
  });

  test('below the depth of investigation it fades to the paper', () => {
    const opacityAt = (depth: number, depthOfInvestigation: number | null) =>
      profileStops({ ...column, depthOfInvestigation }, scale, 40).find(
        (stop) => Math.abs(stop.offset * 40 - depth) < 1e-9,
      )!.opacity;
    expect(opacityAt(30, 30)).toBe(1);
    expect(opacityAt(35, 30)).toBeLessThan(0.7);
    expect(opacityAt(40, 30)).toBeLessThan(0.2);
    expect(opacityAt(40, null)).toBe(1);
  });
});

test('numbers are read on the colour that is there, faded beds on the paper', () => {
  const dark = columnOf([100, 1], [10], [[9, 11]]);
  expect(colorBehind(dark, scale, 300, '#ffffff')).toBe(rampColor(1));
  const faded = { ...dark, depthOfInvestigation: 12 };
  const behind = colorBehind(faded, scale, 390, '#ffffff');
  expect(textColorOn(rampColor(1))).toBe('#ffffff');
  expect(contrastRatio(textColorOn(behind), behind)).toBeGreaterThan(4.5);
  expect(textColorOn(behind)).toBe('#000000');
});
