import { describe, expect, it } from 'vitest';
import type { ImportMapping } from '../../../server/contract/readings';
import type { SpreadType } from '../../../server/contract/spread';
import { AppError } from '../../../server/errors';
import { readSheetFile, type SheetFile } from '../../../server/readings/read-sheet-file';

const read = (
  content: string | Buffer,
  spreadType: SpreadType = 'schlumberger',
  mapping: ImportMapping | null = null,
): SheetFile =>
  readSheetFile('sheet.csv', Buffer.from(content as string), { spreadType, errorFloor: 0.03, mapping });
const rhoa = (sheet: SheetFile): number[] =>
  sheet.good.map(({ derived }) => Number(derived.apparentResistivityOhmM.toPrecision(6)));
const failure = (act: () => unknown): AppError => {
  try {
    act();
  } catch (error) {
    if (error instanceof AppError) return error;
  }
  throw new Error('nothing was refused');
};

const PLAIN = 'AB/2 (m),MN/2 (m),rhoa (ohm m)\n1.5,0.5,118\n2.5,0.5,112\n4,0.5,97\n';

describe('kinds of file', () => {
  it('finds columns, units, delimiter and decimal sign', () => {
    const sheet = read(PLAIN);
    expect(sheet.mapping).toEqual({
      hasHeader: true,
      delimiter: ',',
      decimalMark: '.',
      columns: ['halfAB', 'halfMN', 'apparentResistivity'],
      units: { length: 'm', voltage: 'mV', current: 'mA', resistivity: 'ohm-m', standardError: 'percent' },
    });
    expect(sheet).toMatchObject({ unitsStated: true, missingColumns: [], rowFaults: [], headingFaults: [] });
    expect(rhoa(sheet)).toEqual([118, 112, 97]);
  });

  it('reads semicolons with a decimal comma, tabs, bars, and commas in quotes', () => {
    const semicolons = PLAIN.replaceAll(',', ';').replaceAll('.', ',');
    expect(read(semicolons).mapping).toMatchObject({ delimiter: ';', decimalMark: ',' });
    expect(rhoa(read(semicolons))).toEqual([118, 112, 97]);
    for (const delimiter of ['\t', '|'] as const) {
      const sheet = read(PLAIN.replaceAll(',', delimiter));
      expect([sheet.mapping.delimiter, ...rhoa(sheet)]).toEqual([delimiter, 118, 112, 97]);
    }
    const quoted = 'AB/2 (m),MN/2 (m),rhoa (ohm m)\n"1,5","0,5","118,2"\n"2,5","0,5","112,1"\n';
    expect(read(quoted).mapping).toMatchObject({ delimiter: ',', decimalMark: ',' });
    expect(rhoa(read(quoted))).toEqual([118.2, 112.1]);
  });

  it.each([
    ['UTF-8 with a mark', Buffer.from(`\ufeff${PLAIN}`, 'utf8')],
    ['UTF-16 with a mark', Buffer.from(`\ufeff${PLAIN}`, 'utf16le')],
    ['UTF-16 without a mark', Buffer.from(PLAIN, 'utf16le')],
    ['UTF-16, big end first', Buffer.from(`\ufeff${PLAIN}`, 'utf16le').swap16()],
    ['CRLF', Buffer.from(PLAIN.replaceAll('\n', '\r\n'))],
    ['CR', Buffer.from(PLAIN.replaceAll('\n', '\r'))],
    ['no last line end', Buffer.from(PLAIN.trimEnd())],
  ])('reads %s', (_, bytes) => {
    expect(rhoa(read(bytes))).toEqual([118, 112, 97]);
  });

  it('reads Windows-1252', () => {
    const sheet = read(Buffer.from('AB/2 (m);rhoa (ohm m);Remark\n10;50;caf\u00e9 \u00b1\n', 'latin1'));
    expect(sheet.good[0]?.reading.remark).toBe('café ±');
  });

  it('takes metadata, comments, blank lines and a line of units around the table, and keeps the line numbers', () => {
    const sheet = read(
      [
        'sep=;',
        'Survey;West bank',
        'Date;2026-05-01;Crew;four',
        '',
        '# wet ground',
        'AB/2;MN/2;V;I;Remark',
        '(m);(m);(mV);(mA);',
        '10;1;20;100;"said ""dry""; twice"',
        ';;;;',
        '// moved the stakes',
        '20;1;x;100;',
        '30;1;2;100;"two',
        'lines"',
        '40;1;;100;',
      ].join('\n'),
    );
    expect(sheet.unitsStated).toBe(true);
    expect(sheet.good.map(({ line }) => line)).toEqual([8, 12]);
    expect(sheet.good[0]?.reading.remark).toBe('said "dry"; twice');
    expect(sheet.rowFaults).toEqual([
      expect.objectContaining({ row: 11, column: 'V', found: 'x', message: 'is not a number' }),
      expect.objectContaining({ row: 14, column: 'V', message: 'no ρa follows from this row' }),
    ]);
  });

  it('reads headings that stand in a comment', () => {
    expect(rhoa(read('# a (m); R (ohm)\n5; 2\n10; 1\n', 'wenner'))).toEqual([62.8319, 62.8319]);
  });

  it('is not swallowed by a quote that never closes', () => {
    const sheet = read('a (m),R (ohm),Remark\n5,2,"loose pin\n10,1,\n', 'wenner');
    expect(sheet.good.map(({ line, reading }) => [line, reading.remark])).toEqual([
      [2, '"loose pin'],
      [3, ''],
    ]);
  });
});

describe('units and faults', () => {
  it('turns feet, volts, amperes and Ω·cm into stored units', () => {
    const sheet = read('a (ft),V (V),I (A),rhoa (ohm-cm),error (%)\n20,0.2,0.1,7660,2\n', 'wenner');
    expect(sheet.good[0]?.reading).toMatchObject({
      spread: { spacing: 6.096 },
      voltageMv: 200,
      currentMa: 100,
      sheetApparentResistivityOhmM: 76.6,
      standardError: 0.02,
    });
  });

  it('says when the headings do not name the units', () => {
    expect(read('AB/2,MN/2,rhoa\n10,1,50\n').unitsStated).toBe(false);
    expect(read('AB/2 (m),MN/2 (m),rhoa\n10,1,50\n').unitsStated).toBe(false);
    expect(read('a (m),R\n5,2\n', 'wenner').unitsStated).toBe(true);
  });

  it('tells units that cannot be used, and lengths in two units', () => {
    expect(read('AB/2 (m),MN/2 (ft),rhoa (ohm m)\n10,1,50\n').headingFaults).toEqual([
      expect.objectContaining({ row: 1, column: 'MN/2 (ft)', found: 'ft' }),
    ]);
    expect(read('a (m),V (µV),I (mA)\n10,1,50\n', 'wenner').headingFaults).toEqual([
      expect.objectContaining({ column: 'V (µV)', allowed: 'mV or V' }),
    ]);
  });

  it('refuses a number with the other decimal sign instead of taking 1,234 for 1.234', () => {
    const sheet = read('a (m),rhoa (ohm m)\n1.5,"1,234"\n2.5,1234\n', 'wenner');
    expect(sheet.rowFaults).toEqual([
      expect.objectContaining({ row: 2, column: 'rhoa (ohm m)', found: '1,234' }),
    ]);
  });

  it('tells a decimal comma that cut a row into more values than there are headings', () => {
    const sheet = read('a (m),rhoa (ohm m)\n1,5,100,2\n', 'wenner');
    expect(sheet.rowFaults[0]).toMatchObject({ row: 2, message: 'has 4 values where the headings name 2' });
    expect(sheet.good).toEqual([]);
  });

  it('names the columns that are missing once, not in every row', () => {
    const sheet = read('AB/2 (m),V (mV)\n10,5\n20,3\n');
    expect(sheet.missingColumns).toEqual(['MN/2', 'V and I, or R, or ρa']);
    expect(sheet.rowFaults).toEqual([]);
    expect(read('AB/2 (m),rhoa (ohm m)\n10,50\n').missingColumns).toEqual([]);
    expect(read('AM (m),AN (m),R (ohm)\n9,11,1\n', 'electrodes').missingColumns).toEqual([]);
    expect(read('AM (m),AN (m),BM (m),R (ohm)\n9,11,1,1\n', 'electrodes').missingColumns).toEqual(['BN']);
  });
});

describe('a mapping chosen by the person', () => {
  const mapping = read('a (m),R (ohm)\n5,2\n', 'wenner').mapping;

  it('reads a file without headings, past lines above the numbers', () => {
    const bare = read('Site notes\n5;2\n10;x\n', 'wenner');
    expect(bare).toMatchObject({ headings: ['Column 1', 'Column 2'], mapping: { hasHeader: false } });
    expect(bare.missingColumns).toEqual(['a', 'V and I, or R, or ρa']);
    const chosen = { ...mapping, hasHeader: false, delimiter: ';' as const };
    const sheet = read('Site notes\n5;2\n10;x\n', 'wenner', chosen);
    expect(sheet.good.map(({ line }) => line)).toEqual([2]);
    expect(sheet.rowFaults).toEqual([expect.objectContaining({ row: 3, column: 'Column 2', found: 'x' })]);
  });

  it('reads headings in words of their own', () => {
    const sheet = read('abstand,widerstand\n5,2\n', 'wenner', mapping);
    expect(sheet.headings).toEqual(['abstand', 'widerstand']);
    expect(rhoa(sheet)).toEqual([62.8319]);
  });

  it('takes the units that were chosen', () => {
    const sheet = read('a,R\n20,2\n', 'wenner', { ...mapping, units: { ...mapping.units, length: 'ft' } });
    expect(sheet.good[0]?.reading.spread).toEqual({ type: 'wenner', spacing: 6.096 });
  });

  it('refuses columns of another spread, and one column twice', () => {
    const faults = (columns: ImportMapping['columns']) =>
      failure(() => read('a,R\n5,2\n', 'wenner', { ...mapping, columns })).details.faults?.map(
        (fault) => fault.message,
      );
    expect(faults(['halfAB', 'resistance'])).toEqual(['AB/2 does not belong to a wenner sounding']);
    expect(faults(['spacing', 'spacing'])).toEqual(['a is mapped twice']);
  });
});

describe('files that are no sheet', () => {
  it.each([
    ['an empty file', Buffer.alloc(0), 'invalid', /is empty/],
    ['blank space', Buffer.from(' \n\t\n'), 'invalid', /nothing but blank space/],
    ['a workbook', Buffer.from('504b030414000600', 'hex'), 'unsupported-media', /spreadsheet workbook/],
    ['a PDF', Buffer.from('%PDF-1.7 …'), 'unsupported-media', /a PDF/],
    [
      'noise',
      Buffer.from(Array.from({ length: 3000 }, (_, i) => (i * 197) % 256)),
      'unsupported-media',
      /binary/,
    ],
    ['too many lines', Buffer.from('a (m),R (ohm)\n5,2\n'.repeat(50_000)), 'too-large', /100\u202f001 lines/],
    ['too many rows', Buffer.from(`a (m),R (ohm)\n${'5,2\n'.repeat(5001)}`), 'too-large', /5\u202f001 rows/],
  ])('tells %s plainly', (_, bytes, code, message) => {
    const error = failure(() => read(bytes, 'wenner'));
    expect(error.code).toBe(code);
    expect(error.message).toMatch(message);
  });

  it('takes five thousand rows', () => {
    expect(read(`a (m),R (ohm)\n${'5,2\n'.repeat(5000)}`, 'wenner').good).toHaveLength(5000);
  });

  it('gives text that is no table no readings and says what is missing', () => {
    const sheet = read('Dear crew,\nplease measure again tomorrow.\n');
    expect(sheet.good).toEqual([]);
    expect(sheet.missingColumns).toContain('AB/2');
  });
});
