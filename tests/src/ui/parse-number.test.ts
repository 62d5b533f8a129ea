import { describe, expect, test } from 'vitest';
import { limitFault, parseNumber } from '../../../src/ui/parse-number';

describe('parseNumber', () => {
  test.each([
    ['1e3', 1000],
    ['1.5', 1.5],
    ['1,5', 1.5],
    [' 12 ', 12],
    ['12 400', 12_400],
    ['12\u202f400,5', 12_400.5],
    ['\u22123', -3],
    ['.5', 0.5],
    ['5.', 5],
    ['2E-2', 0.02],
  ])('%s → %d', (text, value) => expect(parseNumber(text)).toEqual({ value, fault: null }));

  test('empty is no value and no fault', () =>
    expect(parseNumber('  ')).toEqual({ value: null, fault: null }));

  test.each(['1,234.5', '1.234,5', '1,2,3'])('%s has two decimal signs and is refused', (text) => {
    const { value, fault } = parseNumber(text);
    expect(value).toBeNull();
    expect(fault).toContain(`“${text}”`);
    expect(fault).toContain('one decimal point or comma');
  });

  test.each(['abc', '12m', '1e', '--3', 'Infinity', '1e999'])('%s is no number', (text) => {
    const { value, fault } = parseNumber(text);
    expect(value).toBeNull();
    expect(fault).toBe(`Found “${text}”: write a number, such as 12.5 or 12,5`);
  });
});

describe('limitFault', () => {
  test.each([
    [0, { above: 0 }, 'must be above 0\u00a0m'],
    [-1, { min: 0 }, 'must be at least 0\u00a0m'],
    [11, { max: 10 }, 'must be at most 10\u00a0m'],
    [360, { below: 360 }, 'must be below 360\u00a0m'],
    [2e8, { max: 1e8 }, 'must be at most 100\u202f000\u202f000\u00a0m'],
    [-9e4, { min: -12_400 }, 'must be at least \u221212\u202f400\u00a0m'],
    [1.5, { integer: true }, 'whole number'],
  ])('%d against %o', (value, limits, words) => expect(limitFault(value, limits, 'm')).toContain(words));

  test('a value on an inclusive limit is right', () => {
    expect(limitFault(0, { min: 0, max: 0 })).toBeNull();
    expect(limitFault(359.999, { below: 360 })).toBeNull();
  });
});
