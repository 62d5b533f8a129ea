import { describe, expect, test } from 'vitest';
import type { GroundColumn } from '../../../src/charts/chart-data';
import { depthScale } from '../../../src/charts/depth-scale';
import { groundLabels } from '../../../src/charts/ground-labels';
import {
  bedSentence,
  depthExtent,
  groundBeds,
  groundBoundaries,
  profileStops,
  shareBelow,
} from '../../../src/charts/ground-profile';
import { groundTable } from '../../../src/charts/ground-table';
import { rampColor } from '../../../src/charts/resistivity-ramp';

const column: GroundColumn = {
  id: 'a',
  letter: 'A',
  name: '3 beds',
  earth: { resistivity: [139, 17, 119], thickness: [2.6, 3.6] },
  intervals: {
    resistivity: [
      [134, 145],
      [3.9, 36],
      [null, null],
    ],
    depth: [
      [2.2, 3.1],
      [null, null],
    ],
  },
  bedNotes: ['dry cover', null, null],
  held: [
    { on: 'resistivity', index: 1 },
    { on: 'thickness', index: 0 },
  ],
};

describe('shareBelow', () => {
  const boundary = { depth: 10, low: 5, high: 20 };
  test.each([
    [4, 0],
    [5, 0],
    [7.5, 0.25],
    [10, 0.5],
    [15, 0.75],
    [20, 1],
    [30, 1],
  ])('at %d m the ground has turned by %d', (depth, share) => {
    expect(shareBelow(depth, boundary)).toBeCloseTo(share, 12);
  });

  test('a boundary without doubt is a step', () => {
    const sharp = { depth: 10, low: 10, high: 10 };
    expect([9.99, 10, 10.01].map((depth) => shareBelow(depth, sharp))).toEqual([0, 1, 1]);
  });
});

describe('profileStops', () => {
  const soft: GroundColumn = { ...column, earth: { resistivity: [100, 1], thickness: [10] } };
  const softAt = (depthOfInvestigation: number | null) =>
    profileStops(
      { ...soft, intervals: { resistivity: [], depth: [[5, 20]] }, depthOfInvestigation },
      depthScale('linear', { minDepth: 1, maxDepth: 40 }, 400),
      40,
    );

  test('the colour turns over the whole interval, half way at the boundary', () => {
    const stops = softAt(null);
    expect(stops[5]!.color).toBe(rampColor(100));
    expect(stops[10]!.color).toBe(rampColor(10));
    expect(stops[20]!.color).toBe(rampColor(1));
    expect(new Set(stops.slice(5, 21).map((stop) => stop.color)).size).toBe(16);
  });

  test('below the depth of investigation it fades to the paper', () => {
    const stops = softAt(30);
    expect(stops[30]!.opacity).toBe(1);
    expect(stops[35]!.opacity).toBeLessThan(0.7);
    expect(stops[40]!.opacity).toBeLessThan(0.2);
    expect(softAt(null)[40]!.opacity).toBe(1);
  });
});

test('boundaries say their interval, and what is not bounded', () => {
  const [first, second] = groundBoundaries(column);
  expect(first).toMatchObject({ depth: 2.6, rangeText: '2.2–3.1\u00a0m', unresolved: false });
  expect(second).toMatchObject({ low: null, high: null, rangeText: 'not bounded', unresolved: true });
});

test('an interval over more than a factor of ten is unresolved', () => {
  const wide = { ...column, intervals: { resistivity: [], depth: [[0.9, 12] as const, [5, 8] as const] } };
  expect(groundBoundaries(wide).map((boundary) => boundary.unresolved)).toEqual([true, false]);
});

test('a model without intervals has sharp boundaries', () => {
  const [first] = groundBoundaries({ ...column, intervals: null });
  expect(first).toMatchObject({ low: 2.6, high: 2.6, rangeText: '', unresolved: false });
});

test('beds are said in words', () => {
  const sentences = groundBeds(column).map(bedSentence);
  expect(sentences[0]).toBe(
    'Bed 1, 139 ohm metres, 0 to 2.6 m, 95 % 134 to 145 ohm metres, dry cover, thickness held',
  );
  expect(sentences[1]).toContain('Bed 2, 17.0 ohm metres, 2.6 to 6.2 m');
  expect(sentences[1]).toMatch(/, resistivity held$/);
  expect(sentences[2]).toContain('below 6.2 m');
});

test('labels beside the bar run down with the ground; a thin bed carries its number', () => {
  const labels = groundLabels(column, depthScale('linear', { minDepth: 1, maxDepth: 100 }, 300));
  expect(labels.map((label) => label.key)).toEqual(['bed 0', 'base 0', 'bed 1', 'base 1', 'bed 2']);
  expect(labels[0]).toMatchObject({ strong: '139 · 134–145', note: 'dry cover' });
  expect(labels[2]).toMatchObject({ strong: '17.0 · 3.9–36', note: 'ρ held' });
  expect(labels[1]).toMatchObject({ strong: '2.2–3.1\u00a0m', note: 'h held' });
  expect(labels[3]).toMatchObject({ strong: 'not bounded', note: 'unresolved' });
});

test('depths reach past every boundary, the depth of investigation and the borehole', () => {
  const { minDepth, maxDepth } = depthExtent([column], null);
  expect(minDepth).toBeLessThan(2.2);
  expect(maxDepth).toBeGreaterThan(6.2);
  expect(depthExtent([{ ...column, depthOfInvestigation: 80 }], null).maxDepth).toBeGreaterThan(80);
  const log = { name: 'B', beds: [{ top: 0, base: 120, label: 'sand' }] };
  expect(depthExtent([column], log).maxDepth).toBeGreaterThan(120);
});

test('the table gives every bed with its interval', () => {
  const { columns, rows } = groundTable([column]);
  expect(columns.map((head) => head.label)).toContain('Base, high');
  expect(rows[0]).toEqual([1, 139, 134, 145, 0, 2.6, 2.2, 3.1, 'dry cover, h held']);
  expect(rows[2]).toEqual([3, 119, null, null, 6.2, null, null, null, '']);
  expect(groundTable([column, { ...column, id: 'b', letter: 'B' }]).rows[3]![0]).toBe('B');
});
