import { expect, it } from 'vitest';
import { outcomeRows } from '../../../../src/features/side-by-side/run-facts-table';

const run = (resistivity: number[], thickness: number[]) =>
  ({
    result: {
      earth: { resistivity, thickness },
      chi2PerReading: 1,
      rmsPercent: 3,
      darZarrouk: {
        totalConductanceS: thickness.length === 0 ? 0 : 0.05,
        totalResistanceOhmM2: thickness.length === 0 ? 0 : 1250,
      },
    },
  }) as Parameters<typeof outcomeRows>[0][number];

it('says that one bed alone has no sums, rather than none at all as a number', () => {
  const rows = outcomeRows([run([80], []), run([100, 20], [5])]);
  const valuesOf = (label: string) =>
    rows.find((row) => row.label.startsWith(label))?.values.map((value) => value.replace('\u00a0', ' '));
  expect(valuesOf('S')).toEqual(['none', '0.0500 S']);
  expect(valuesOf('T')).toEqual(['none', '1250 Ω·m²']);
});
