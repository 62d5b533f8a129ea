import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseSheetNumber, scaleNumber, writeNumber } from '../../../server/contract/sheet-number';

describe('parseSheetNumber', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    [' 1 234,5 ', 1234.5],
    ['1\u202f234\u00a0567.25', 1234567.25],
    ['1e3', 1000],
    ['1,5E-2', 0.015],
    ['−4.2', -4.2],
    ['+7', 7],
    ['.5', 0.5],
    ['5.', 5],
  ])('reads %j as %d', (text, value) => {
    expect(parseSheetNumber(text).value).toBe(value);
  });

  it.each([
    '1,5,2',
    '1.234,5',
    '1,234.5',
    '12 5',
    '1 23',
    'abc',
    '1e',
    '0x10',
    'NaN',
    'Infinity',
    '1e999',
    '- 4',
  ])('refuses %j', (text) => {
    expect(parseSheetNumber(text)).toMatchObject({ value: null, message: expect.any(String) });
  });

  it('holds to the decimal sign of a file', () => {
    expect(parseSheetNumber('1,234', '.').message).toMatch(/decimal comma where the file uses a point/);
    expect(parseSheetNumber('1.234', ',').message).toMatch(/decimal point where the file uses a comma/);
    expect(parseSheetNumber('1,234', ',').value).toBe(1.234);
    expect(parseSheetNumber('1234', ',').value).toBe(1234);
  });
});

describe('writeNumber', () => {
  it('gives a text that parses to the stored value again in every unit', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 1e9, noNaN: true }),
        fc.constantFrom(1, 0.3048, 0.01, 1000),
        (typed, scale) => {
          const stored = scaleNumber(typed, scale);
          expect(scaleNumber(Number(writeNumber(stored, scale)), scale)).toBe(stored);
        },
      ),
      { seed: 1, numRuns: 3000 },
    );
  });
});
