import { describe, expect, test } from 'vitest';
import {
  formatCount,
  formatDay,
  formatDuration,
  formatFixed,
  formatGiven,
  formatGivenLength,
  formatLength,
  formatMoment,
  formatPercent,
  formatRange,
  formatRelativeError,
  formatResistivity,
  formatSignificant,
} from '../../../src/ui/format';

const THIN = '\u202f';
const NBSP = '\u00a0';

test.each([
  [0.1, '0.1'],
  [7000, '7000'],
  [12_400.5, `12${THIN}400.5`],
  [1e9, `1${THIN}000${THIN}000${THIN}000`],
  [-0.25, '\u22120.25'],
  [Number.NaN, '–'],
])('%d is told as it was given', (value, text) => expect(formatGiven(value)).toBe(text));

test.each([
  [1.9, '1.9'],
  [34, '34'],
  [8.5 * 0.3048, '2.5908'],
  [0.1 + 0.2, '0.3'],
])('a length of %d is told as it was written', (value, text) => expect(formatGivenLength(value)).toBe(text));

describe('resistivity', () => {
  test.each([
    [0.01234, '0.0123'],
    [1.2, '1.20'],
    [12.36, '12.4'],
    [139, '139'],
    [9.996, '10.0'],
    [1236, '1240'],
    [9996, `10${THIN}000`],
    [12_360, `12${THIN}400`],
    [1_234_567, `1${THIN}230${THIN}000`],
    [0, '0'],
    [-12.36, '\u221212.4'],
    [Number.NaN, '–'],
  ])('%d → %s', (value, text) => expect(formatResistivity(value)).toBe(text));

  test('an extremely small value falls back to a power', () => {
    expect(formatSignificant(1.5e-12)).toBe('1.50e\u221212');
  });
});

test.each([
  [3.14159, '3.14'],
  [9.94, '9.94'],
  [9.96, '9.96'],
  [41.83, '41.8'],
  [0.0456, '0.0456'],
])('length %d → %s', (value, text) => expect(formatLength(value)).toBe(text));

describe('ranges', () => {
  test.each([
    [134.2, 144.8, '134–145'],
    [3.9, 36.2, '3.90–36.2'],
    [109, 151, '109–151'],
    [11, 13.2, '11.0–13.2'],
    [2.21, 3.14, '2.21–3.14'],
    [138.23, 138.91, '138–139'],
    [0.1, 46.4, '0.100–46.4'],
    [3.1, 99_800, `3.10–99${THIN}800`],
    [12_340, 15_680, `12${THIN}300–15${THIN}700`],
  ])('%d to %d → %s', (low, high, text) => expect(formatRange([low, high])).toBe(text));

  test('open ends are said in words', () => {
    expect(formatRange([null, 52.04])).toBe('at most 52.0');
    expect(formatRange([3.21, null])).toBe('at least 3.21');
    expect(formatRange([null, null])).toBe('not bounded');
  });

  test('ends that read the same are one number', () => expect(formatRange([12.01, 12.02])).toBe('12.0'));

  test('a range of no width is that of a held value', () => expect(formatRange([25.5, 25.5])).toBe('held'));
});

test('fixed decimals keep a true minus and no minus zero', () => {
  expect(formatFixed(-1.236, 2)).toBe('\u22121.24');
  expect(formatFixed(-0.001, 2)).toBe('0.00');
});

test('percentages', () => {
  expect(formatPercent(2.94)).toBe(`2.9${NBSP}%`);
  expect(formatRelativeError(0.03)).toBe(`3.0${NBSP}%`);
  expect(formatRelativeError(0.124)).toBe(`12${NBSP}%`);
});

describe('moments', () => {
  const now = new Date(2026, 2, 10, 10, 0);
  test.each([
    [new Date(2026, 2, 10, 9, 12), 'today 09:12'],
    [new Date(2026, 2, 9, 23, 59), 'yesterday 23:59'],
    [new Date(2026, 2, 3, 14, 5), '3 Mar 14:05'],
    [new Date(2024, 2, 3, 14, 5), '3 Mar 2024'],
  ])('%s → %s', (moment, text) => expect(formatMoment(moment, now)).toBe(text));

  test('a plain day is the same day in every time zone', () =>
    expect(formatDay('2024-03-03')).toBe('3 Mar 2024'));
});

test('durations', () => {
  expect(formatDuration(11.4)).toBe(`11${NBSP}ms`);
  expect(formatDuration(999.6)).toBe(`1.0${NBSP}s`);
  expect(formatDuration(125_000)).toBe(`2${NBSP}min${NBSP}05${NBSP}s`);
});

test('counts', () => {
  expect(formatCount(1, 'reading')).toBe('1 reading');
  expect(formatCount(12_400, 'reading')).toBe(`12${THIN}400 readings`);
  expect(formatCount(2, 'survey', 'surveys')).toBe('2 surveys');
});
