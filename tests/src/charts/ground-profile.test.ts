import { expect, test } from 'vitest';
import type { GroundColumn } from '../../../src/charts/chart-data';
import { depthScale } from '../../../src/charts/depth-scale';
import { groundLabels, labelRoom } from '../../../src/charts/ground-labels';
import { bedSentence, depthExtent, groundBeds, groundBoundaries } from '../../../src/charts/ground-profile';
import { groundTable } from '../../../src/charts/ground-table';

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

const hundred = depthScale('linear', { minDepth: 1, maxDepth: 100 }, 300);

test('boundaries say their interval, and what is not bounded', () => {
  const [first, second] = groundBoundaries(column);
  expect(first).toMatchObject({ depth: 2.6, rangeText: '2.20–3.10\u00a0m', unresolved: false });
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

test('a value that the run held is drawn without a range, and its row has no ends', () => {
  const intervals = {
    resistivity: [[134, 145] as const, [17, 17] as const, [100, 150] as const],
    depth: [[2.6, 2.6] as const, [5, 8] as const],
  };
  const run = { ...column, intervals };
  expect(groundBoundaries(run).map(({ rangeText }) => rangeText)).toEqual(['', '5.00–8.00\u00a0m']);
  const labels = groundLabels(run, hundred, 200);
  expect(labels[1]).toMatchObject({ strong: ['2.60\u00a0m'], note: 'h held' });
  expect(labels[2]).toMatchObject({ strong: ['17.0'], note: 'ρ held' });
  expect(bedSentence(groundBeds(run)[1]!)).not.toContain('95');
  const { rows } = groundTable([run]);
  expect(rows[0]!.slice(6, 8)).toEqual([null, null]);
  expect(rows[1]!.slice(2, 4)).toEqual([null, null]);
});

test('beds are said in words', () => {
  const sentences = groundBeds(column).map(bedSentence);
  expect(sentences[0]).toBe(
    'Bed 1, 139 ohm metres, 0 to 2.60 m, 95\u00a0% 134 to 145 ohm metres, dry cover, thickness held',
  );
  expect(sentences[1]).toContain('Bed 2, 17.0 ohm metres, 2.60 to 6.20 m');
  expect(sentences[1]).toMatch(/, resistivity held$/);
  expect(sentences[2]).toContain('below 6.20 m');
});

test('labels beside the bar run down with the ground; a thin bed carries its number', () => {
  const labels = groundLabels(column, hundred, 200);
  expect(labels.map((label) => label.key)).toEqual(['bed 0', 'base 0', 'bed 1', 'base 1', 'bed 2']);
  expect(labels[0]).toMatchObject({ strong: ['139 · 134–145'], note: 'dry cover' });
  expect(labels[2]).toMatchObject({ strong: ['17.0 · 3.90–36.0'], note: 'ρ held' });
  expect(labels[1]).toMatchObject({ strong: ['2.20–3.10\u00a0m'], note: 'h held' });
  expect(labels[3]).toMatchObject({ strong: ['not bounded'], note: 'unresolved' });
});

test('number and interval part where one line is too long, and where the readings reject the model', () => {
  expect(groundLabels(column, hundred, 80)[2]!.strong).toEqual(['17.0', '3.90–36.0']);
  expect(groundLabels({ ...column, isRejected: true }, hundred, 200)[2]!.strong).toEqual([
    '17.0',
    '3.90–36.0',
  ]);
  expect(labelRoom(column, hundred)).toBe('not bounded'.length * 7.2);
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

test('the table calls cells cells', () => {
  const cells = { ...column, isCells: true };
  const nameOf = (columns: GroundColumn[]) =>
    groundTable(columns).columns.find(({ label }) => /bed|cell/i.test(label))?.label;
  expect(nameOf([column])).toBe('Bed');
  expect(nameOf([cells, cells])).toBe('Cell');
  expect(nameOf([column, cells])).toBe('Bed or cell');
});
