import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { createForwardOperator } from '../../inversion/index';
import { crewSheet } from '../../server/demo/crew-sheet';
import { SOUNDINGS, spreadsOf } from '../../server/demo/scenario';
import { readSheetFile } from '../../server/readings/read-sheet-file';

describe.each([
  { name: 'S-04', readings: 24, delimiter: ';', decimalMark: ',' },
  { name: 'S-05', readings: 14, delimiter: ',', decimalMark: '.' },
  { name: 'S-07', readings: 24, delimiter: ',', decimalMark: '.' },
])('the sheet of $name', ({ name, readings, delimiter, decimalMark }) => {
  const sounding = SOUNDINGS.find((one) => one.name === name)!;
  const bytes = readFileSync(new URL(`../../examples/sheets/${name}.csv`, import.meta.url));

  it('is the sheet of the demo', () => {
    expect(bytes.toString('utf8')).toBe(crewSheet(sounding));
  });

  it('is read whole, its delimiter, decimal mark and units found', () => {
    const sheet = readSheetFile(`${name}.csv`, bytes, {
      spreadType: sounding.array,
      errorFloor: 0.03,
      mapping: null,
    });
    expect(sheet.rowFaults).toEqual([]);
    expect(sheet.unitsStated).toBe(true);
    expect(sheet.mapping).toMatchObject({ delimiter, decimalMark, hasHeader: true });
    expect(sheet.good).toHaveLength(readings);
  });

  it('gives the curve of the ground that the scenario states, within its scatter', () => {
    const sheet = readSheetFile(`${name}.csv`, bytes, {
      spreadType: sounding.array,
      errorFloor: 0.03,
      mapping: null,
    });
    const exact = createForwardOperator(spreadsOf(sounding.array)).predict(sounding.ground);
    const misses = sheet.good.map(({ derived }, i) => Math.log(derived.apparentResistivityOhmM / exact[i]!));
    const usual = misses.filter((miss) => Math.abs(miss) < 0.12);
    expect(misses.length - usual.length).toBe(sounding.trouble?.kind === 'outlier' ? 1 : 0);
    expect(Math.sqrt(usual.reduce((sum, miss) => sum + miss * miss, 0) / usual.length)).toBeLessThan(0.045);
  });
});
