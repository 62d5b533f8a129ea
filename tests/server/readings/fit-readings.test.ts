import { expect, it } from 'vitest';
import type { Reading } from '../../../server/contract/readings';
import { fitReadingsOf } from '../../../server/readings/fit-readings';

const reading = (spacing: number, values: Partial<Reading> = {}): Reading => ({
  spread: { type: 'wenner', spacing },
  voltageMv: null,
  currentMa: null,
  resistanceOhm: null,
  sheetApparentResistivityOhmM: 50,
  standardError: null,
  remark: '',
  excluded: null,
  ...values,
});

it('keeps the row numbers past readings that are left out, and adds the floor to the own error', () => {
  const kept = fitReadingsOf(
    [reading(1), reading(2, { excluded: 'fence' }), reading(4, { standardError: 0.04 })],
    0.03,
  );
  expect(kept.map(({ row, reading: { relativeError } }) => [row, relativeError])).toEqual([
    [1, 0.03],
    [3, expect.closeTo(0.05, 14)],
  ]);
  expect(kept[1]).toMatchObject({
    plottingSpacingM: 6,
    reading: { spread: { type: 'wenner', spacing: 4 }, apparentResistivity: 50 },
  });
});
