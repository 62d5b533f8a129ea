import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatSheetRow,
  geometricFactorOfRow,
  parseSheet,
  parseSheetRow,
} from '../../../server/contract/field-sheet';
import {
  DEFAULT_SHEET_UNITS as SI,
  readingSchema,
  sheetUnitsSchema,
  type Reading,
  type SheetRow,
} from '../../../server/contract/readings';
import { allowedNumber } from '../../../server/contract/sheet-cells';

const row = (cells: SheetRow['cells'], excluded: string | null = null): SheetRow => ({ cells, excluded });

describe('parseSheetRow', () => {
  it('turns the units of the sheet into stored units', () => {
    const units = sheetUnitsSchema.parse({
      length: 'ft',
      voltage: 'V',
      current: 'A',
      resistivity: 'ohm-cm',
      standardError: 'percent',
    });
    const cells = {
      spacing: '20',
      voltage: '0,2',
      current: '0.1',
      apparentResistivity: '7660',
      standardError: '2',
    };
    const { reading, derived } = parseSheetRow(row(cells), 'wenner', units, { errorFloor: 0.03 });
    expect(reading).toMatchObject({
      spread: { type: 'wenner', spacing: 6.096 },
      voltageMv: 200,
      currentMa: 100,
      sheetApparentResistivityOhmM: 76.6,
      standardError: 0.02,
    });
    // MIL-HDBK-419A: 2 Ω at 20 ft is 7662 Ω·cm with a rounded 2π: seen in print
    expect(Math.abs((derived?.apparentResistivityOhmM ?? 0) - 76.62)).toBeLessThan(0.05);
  });

  it('names the column, what was found and what is allowed', () => {
    const { faults } = parseSheetRow(
      row({ halfAB: '1,5,2', halfMN: '0.5', voltage: 'x', current: '9' }),
      'schlumberger',
      SI,
    );
    expect(faults).toEqual([
      {
        column: 'halfAB',
        found: '1,5,2',
        message: 'has more than one decimal sign',
        allowed: 'a number above 0\u00a0m and up to 1\u202f000\u202f000\u00a0m, such as 12.5 or 12,5',
      },
      expect.objectContaining({ column: 'voltage', found: 'x', message: 'is not a number' }),
    ]);
  });

  it('writes what is allowed as every number is written', () =>
    expect(allowedNumber('voltage', SI)).toBe(
      'a number from \u221210\u202f000\u202f000\u00a0mV to 10\u202f000\u202f000\u00a0mV, such as 12.5 or 12,5',
    ));

  it.each([
    ['schlumberger', { halfMN: '0.5', resistance: '1' }, 'halfAB', /missing/],
    ['schlumberger', { halfAB: '5', halfMN: '5', resistance: '1' }, 'halfMN', /AB\/2 is 5 m/],
    ['schlumberger', { halfAB: '5', resistance: '1' }, 'halfMN', /without MN/],
    ['schlumberger', { halfAB: '-5', apparentResistivity: '9' }, 'halfAB', /too small/],
    ['wenner', { spacing: '2', apparentResistivity: '0' }, 'apparentResistivity', /too small/],
    ['wenner', { spacing: '2', resistance: '1', standardError: '101' }, 'standardError', /too large/],
    ['wenner', { spacing: '2', voltage: '5', current: '0' }, 'current', /no current/],
    ['wenner', { spacing: '2', voltage: '-5', current: '10' }, 'voltage', /K·V\/I gives -/],
    ['dipole-dipole', { dipole: '5', resistance: '1' }, 'n', /missing/],
    ['electrodes', { am: '1', an: '2', bm: '2', resistance: '1' }, 'bn', /alone cannot be at infinity/],
    ['electrodes', { resistance: '1' }, 'am', /missing/],
  ] as const)('refuses a %s row %o at %s', (spreadType, cells, column, message) => {
    const { faults } = parseSheetRow(row(cells), spreadType, SI);
    expect(faults?.[0]?.column).toBe(column);
    expect(faults?.[0]?.message).toMatch(message);
  });

  it('takes both distances of an electrode at infinity blank or as ∞', () => {
    const cells = { am: '9', an: '11', resistance: '1' };
    const blank = parseSheetRow(row(cells), 'electrodes', SI);
    const written = parseSheetRow(row({ ...cells, bm: '∞', bn: 'inf' }), 'electrodes', SI);
    expect(blank.reading?.spread).toEqual({ type: 'electrodes', am: 9, an: 11, bm: null, bn: null });
    expect(written).toEqual(blank);
  });

  it('asks for the reason of a reading that is left out', () => {
    const cells = { spacing: '2', resistance: '1' };
    expect(parseSheetRow(row(cells, '  '), 'wenner', SI).faults?.[0]?.column).toBe('excluded');
    expect(parseSheetRow(row(cells, ' wet pin '), 'wenner', SI).reading?.excluded).toBe('wet pin');
  });
});

describe('parseSheet', () => {
  it('keeps the numbers of the rows past blank ones', () => {
    const sheet = parseSheet(
      [
        row({ spacing: '1', resistance: '10' }),
        row({ spacing: ' ' }),
        row({}),
        row({ spacing: '2', resistance: 'ten' }),
        row({ spacing: '4', resistance: '3' }),
      ],
      'wenner',
      SI,
    );
    expect(sheet.rows).toEqual([1, 5]);
    expect(sheet.derived).toHaveLength(2);
    expect(sheet.faults).toEqual([expect.objectContaining({ row: 4, column: 'R', found: 'ten' })]);
  });

  // A printed Schlumberger field sheet, AB/2 and MN/2 → K: seen in print
  it.each([
    [1.5, 0.5, 6.3],
    [2.5, 0.5, 18.8],
    [2.5, 1, 8.2],
    [10, 1, 155.5],
    [10, 2.5, 58.9],
    [20, 2.5, 247.4],
    [20, 10, 47.1],
    [50, 10, 377.0],
    [100, 10, 1555.1],
    [200, 10, 6267.5],
  ])('shows K of a half-written row: AB/2 %d, MN/2 %d → %d', (halfAB, halfMN, printed) => {
    const cells = { halfAB: String(halfAB), halfMN: String(halfMN) };
    const k = geometricFactorOfRow(row(cells), 'schlumberger', SI);
    expect(Math.abs((k ?? 0) - printed)).toBeLessThan(0.051);
  });

  it('shows no K where the lengths cannot be used', () => {
    expect(geometricFactorOfRow(row({ halfAB: '5' }), 'schlumberger', SI)).toBeNull();
    expect(geometricFactorOfRow(row({ halfAB: 'x', halfMN: '1' }), 'schlumberger', SI)).toBeNull();
    expect(geometricFactorOfRow(row({ am: '1', an: '1', bm: '2', bn: '2' }), 'electrodes', SI)).toBeNull();
  });
});

const tidy = (low: number, high: number) =>
  fc.double({ min: low, max: high, noNaN: true }).map((value) => Number(value.toPrecision(6)));
const anyReading: fc.Arbitrary<Reading> = fc
  .record({
    spread: fc.oneof(
      fc.record({ type: fc.constant('schlumberger' as const), halfAB: tidy(10, 900), halfMN: tidy(0.1, 5) }),
      fc.record({ type: fc.constant('wenner' as const), spacing: tidy(0.1, 900) }),
      fc.record({ type: fc.constant('dipole-dipole' as const), dipole: tidy(1, 90), n: tidy(1, 10) }),
      fc.record({
        type: fc.constant('electrodes' as const),
        am: tidy(1, 9),
        an: tidy(10, 20),
        bm: fc.constant(null),
        bn: fc.constant(null),
      }),
    ),
    voltageMv: fc.option(tidy(0.01, 5000)),
    currentMa: fc.option(tidy(1, 900)),
    resistanceOhm: fc.option(tidy(0.001, 500)),
    sheetApparentResistivityOhmM: tidy(0.1, 20000),
    standardError: fc.option(tidy(0, 1)),
    remark: fc.constantFrom('', 'wet ground, “gate”'),
    excluded: fc.option(fc.constant('fence beside M')),
  })
  .map((reading) => readingSchema.parse(reading));

describe('formatSheetRow', () => {
  it('writes cells that parse to the same reading in every unit', () => {
    const units = fc.record({
      length: fc.constantFrom('m' as const, 'ft' as const),
      voltage: fc.constantFrom('mV' as const, 'V' as const),
      current: fc.constantFrom('mA' as const, 'A' as const),
      resistivity: fc.constantFrom('ohm-m' as const, 'ohm-cm' as const, 'ohm-ft' as const),
      standardError: fc.constantFrom('percent' as const, 'relative' as const),
    });
    fc.assert(
      fc.property(anyReading, units, (reading, sheetUnits) => {
        const parsed = parseSheetRow(formatSheetRow(reading, sheetUnits), reading.spread.type, sheetUnits);
        expect(parsed.reading).toEqual(reading);
      }),
      { seed: 7, numRuns: 400 },
    );
  });
});
