import { describe, expect, it } from 'vitest';
import { DEFAULT_SHEET_UNITS, type Reading, type SheetRow } from '../../../../server/contract/readings';
import { compareSheets } from '../../../../src/features/readings/compare-sheets';
import { importReadiness } from '../../../../src/features/readings/import-readiness';
import { rowParts } from '../../../../src/features/readings/row-parts';
import { createSheetReader } from '../../../../src/features/readings/sheet-reader';
import { startSheet } from '../../../../src/features/readings/start-sheet';
import { thinReadings } from '../../../../src/features/readings/thin-readings';
import { rowRange } from '../../../../src/features/readings/use-row-window';

const row = (cells: SheetRow['cells'], excluded: string | null = null): SheetRow => ({ cells, excluded });
const good = row({ halfAB: '10', halfMN: '0.5', voltage: '10', current: '100' });

describe('reading a sheet', () => {
  const read = createSheetReader('schlumberger', DEFAULT_SHEET_UNITS, 0.03);

  it('gives readings with their row, faults with their cell, and nothing for blank rows', () => {
    const sheet = read([good, row({}), row({ halfAB: 'x', voltage: '1,5,2' })]);
    expect(sheet.readings.map((reading) => reading.row)).toEqual([1]);
    // K = π(10² − 0.5²)/(2·0.5) = 313.37 m, R = 0.1 Ω
    expect(sheet.readings[0]?.derived.apparentResistivityOhmM).toBeCloseTo(31.337, 3);
    expect(sheet.faults.map(({ row: at, column }) => [at, column])).toEqual([
      [3, 'halfAB'],
      [3, 'voltage'],
    ]);
    expect(sheet.lines).toHaveLength(3);
    expect(sheet.lines[1]?.parsed).toBeNull();
  });

  it('tells K as soon as the lengths stand, whatever else is missing', () => {
    const [line] = read([row({ halfAB: '10', halfMN: '0.5' })]).lines;
    expect(line?.parsed?.faults).not.toBeNull();
    expect(line?.geometricFactorM).toBeCloseTo(313.374, 2);
  });

  it('does not read an unchanged row again', () => {
    const first = read([good]).lines[0];
    expect(read([row({}), good]).lines[1]).toBe(first);
  });
});

describe('two people on one sheet', () => {
  const reading = (halfAB: number, voltageMv: number, excluded: string | null = null): Reading => ({
    spread: { type: 'schlumberger', halfAB, halfMN: 0.5 },
    voltageMv,
    currentMa: 100,
    resistanceOhm: null,
    sheetApparentResistivityOhmM: null,
    standardError: null,
    remark: '',
    excluded,
  });

  it('differ where values, presence or leaving out differ; the rest is counted', () => {
    const { differences, same } = compareSheets(
      [reading(1, 10), reading(2, 20), reading(3, 30)],
      [reading(1, 10), reading(2, 21), reading(4, 40)],
      DEFAULT_SHEET_UNITS,
    );
    expect(same).toBe(1);
    expect(
      differences.map(({ spacing, mine, theirs }) => [spacing, mine?.cells.voltage, theirs?.cells.voltage]),
    ).toEqual([
      ['2 / 0.5', '20', '21'],
      ['3 / 0.5', '30', undefined],
      ['4 / 0.5', undefined, '40'],
    ]);
    expect(compareSheets([reading(1, 1)], [reading(1, 1, 'wet')], DEFAULT_SHEET_UNITS).same).toBe(0);
  });

  it('tell who changed a reading since the revision both began from, and from what', () => {
    const { differences } = compareSheets(
      [reading(1, 11), reading(2, 20), reading(3, 31), reading(4, 40), reading(6, 60)],
      [reading(1, 10), reading(2, 21), reading(3, 32), reading(5, 50), reading(6, 60, 'wet')],
      DEFAULT_SHEET_UNITS,
      [reading(1, 10), reading(2, 20), reading(3, 30), reading(4, 40), reading(6, 60)],
    );
    const words = (row: SheetRow | null, base: SheetRow | null | undefined) =>
      rowParts(row, base, DEFAULT_SHEET_UNITS)
        .filter(({ change }) => change !== null)
        .map(({ text, change }) => `${text} ${change}`.replaceAll('\u00a0', ' ').trim());
    expect(
      differences.map((found) => [
        found.spacing.split(' ')[0],
        found.changedBy,
        words(found.mine, found.base),
        words(found.theirs, found.base),
      ]),
    ).toEqual([
      ['1', 'me', ['V 11 mV was 10 mV'], []],
      ['2', 'them', [], ['V 21 mV was 20 mV']],
      ['3', 'both', ['V 31 mV was 30 mV'], ['V 32 mV was 30 mV']],
      ['4', 'them', [], ['not there taken out']],
      ['6', 'them', [], ['left out: wet was kept']],
      ['5', 'them', [], ['added']],
    ]);
  });

  it('tell of no change where the revision before is not known', () => {
    const { differences } = compareSheets([reading(1, 11)], [reading(1, 10)], DEFAULT_SHEET_UNITS);
    expect(differences[0]).toMatchObject({ base: undefined, changedBy: null });
    expect(
      rowParts(differences[0]!.mine, undefined, DEFAULT_SHEET_UNITS).map(({ change }) => change),
    ).toEqual([null, null]);
  });

  it('pair repeats of one spacing in their order', () => {
    const { differences, same } = compareSheets(
      [reading(1, 10), reading(1, 11)],
      [reading(1, 10), reading(1, 12)],
      DEFAULT_SHEET_UNITS,
    );
    expect([differences.length, same]).toEqual([1, 1]);
  });
});

describe('what a sheet opens with', () => {
  const draft = {
    rows: [good],
    units: DEFAULT_SHEET_UNITS,
    baseRevisionId: null,
    updatedAt: '2026-01-02T10:00:00.000Z',
  };
  const base = { soundingId: 'x', spreadType: 'schlumberger', revision: null } as const;
  const local = (editedAt: string) => ({
    draft: { rows: [row({ halfAB: '7' })], units: DEFAULT_SHEET_UNITS, baseRevisionId: null },
    editedAt,
  });

  it('is whatever was written last, here or on the server', () => {
    expect(startSheet({ ...base, draft: null }, null).origin).toBe('empty');
    expect(startSheet({ ...base, draft }, null).origin).toBe('draft');
    expect(startSheet({ ...base, draft }, local('2026-01-02T10:00:01.000Z')).origin).toBe('unsent');
    expect(startSheet({ ...base, draft }, local('2026-01-02T09:59:59.000Z')).origin).toBe('draft');
    const unsent = startSheet({ ...base, draft: null }, local('2026-01-01T00:00:00.000Z'));
    expect(unsent.content.rows[0]?.cells.halfAB).toBe('7');
  });
});

describe('reading in a file', () => {
  const preview = { faults: [], rows: [{ line: 2 }], readings: [{}], missingColumns: [], unitsStated: true };
  const inLine = (row: number) => [{ row, column: 'V', found: 'x', message: '', allowed: '' }];
  const readiness = (change: object, unitsConfirmed = false) =>
    importReadiness({ ...preview, ...change } as never, unitsConfirmed);

  it('is open as a whole only without faults, and by its good rows only with some', () => {
    expect(readiness({})).toEqual({ all: true, goodRows: false });
    expect(readiness({ faults: inLine(2) })).toEqual({ all: false, goodRows: true });
  });

  it('is closed to good rows too when the headings are at fault', () => {
    expect(readiness({ faults: inLine(1) })).toEqual({ all: false, goodRows: false });
  });

  it('waits for the units to be stated, for every column, and for at least one reading', () => {
    expect(readiness({ unitsStated: false }).all).toBe(false);
    expect(readiness({ unitsStated: false }, true).all).toBe(true);
    expect(readiness({ missingColumns: ['AB/2'] }, true).all).toBe(false);
    expect(readiness({ faults: inLine(2), readings: [] }, true).goodRows).toBe(false);
  });
});

describe('rows that are drawn', () => {
  it('are those in view and some around them', () => {
    expect(rowRange(5000, 33, { scrollTop: 0, height: 660 })).toEqual({ start: 0, end: 32 });
    expect(rowRange(5000, 33, { scrollTop: 33_000, height: 660 })).toEqual({ start: 988, end: 1032 });
    expect(rowRange(10, 33, { scrollTop: 33_000, height: 660 })).toEqual({ start: 10, end: 10 });
  });
});

describe('a curve of thousands', () => {
  it('is drawn by a few hundred of its readings, from the first to the last', () => {
    const items = Array.from({ length: 4990 }, (_, i) => i);
    const { drawn, every } = thinReadings(items);
    expect(every).toBe(13);
    expect(drawn.length).toBeLessThanOrEqual(401);
    expect([drawn[0], drawn.at(-1)]).toEqual([0, 4989]);
    expect(thinReadings([1, 2, 3])).toEqual({ drawn: [1, 2, 3], every: 1 });
  });
});
