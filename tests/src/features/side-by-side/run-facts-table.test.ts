import { expect, it } from 'vitest';
import { fitSettingsSchema } from '../../../../server/contract/fit-settings';
import { outcomeRows, settingRows } from '../../../../src/features/side-by-side/run-facts-table';

type FinishedRun = Parameters<typeof outcomeRows>[0][number];

const run = (resistivity: number[], thickness: number[], settings: object = { kind: 'layered' }) =>
  ({
    settings: fitSettingsSchema.parse(settings),
    readings: [],
    requestedBy: { name: '' },
    requestedAt: '2024-03-03T10:00:00Z',
    result: {
      earth: { resistivity, thickness },
      chi2PerReading: 1,
      rmsPercent: 3,
      darZarrouk: {
        totalConductanceS: thickness.length === 0 ? 0 : 0.05,
        totalResistanceOhmM2: thickness.length === 0 ? 0 : 1250,
      },
    },
  }) as unknown as FinishedRun;

const rowOf = (rows: ReturnType<typeof outcomeRows>, label: string) => {
  const found = rows.find((row) => row.label.startsWith(label));
  return [...(found?.values.map((value) => value.replaceAll('\u00a0', ' ')) ?? []), found?.differs];
};

it('tells how deep a sum reaches, and that one bed alone has none rather than 0', () => {
  const rows = outcomeRows([run([80], []), run([100, 20, 50], [5, 2])]);
  expect(rowOf(rows, 'S')).toEqual(['none', '0.0500 S down to 7.00 m', true]);
  expect(rowOf(rows, 'T')).toEqual(['none', '1250 Ω·m² down to 7.00 m', true]);
});

it('sets no sum of cells against one of beds', () => {
  const rows = outcomeRows([run([100, 20], [5]), run([100, 20], [5], { kind: 'smooth' })]);
  expect(rowOf(rows, 'S')).toEqual(['0.0500 S down to 5.00 m', '–, cells', false]);
  expect(rowOf(rows, 'T')).toEqual(['1250 Ω·m² down to 5.00 m', '–, cells', false]);
});

it('says of a setting that a kind of ground does not have that it does not apply', () => {
  const beds = run([100, 20], [5], { kind: 'layered', layers: 2, branchShiftSigma: 0.1 });
  const rows = settingRows([beds, run([100, 20], [5], { kind: 'stepped', outlierTolerant: true })]);
  expect(rowOf(rows, 'Ground')).toEqual(['beds', 'few steps, the usual grid of cells', true]);
  expect(rowOf(rows, 'Beds')).toEqual(['2 beds', 'does not apply', false]);
  expect(rowOf(rows, 'Start')).toEqual(['the curve', 'does not apply', false]);
  expect(rowOf(rows, 'Target')).toEqual(['does not apply', 'χ²/N 1.00', false]);
  expect(rowOf(rows, 'Branches')).toEqual(['shifted, each within about 10 %', 'not shifted', true]);
  expect(rowOf(rows, 'Outliers')).toEqual(['count in full', 'count for less', true]);
  expect(rows.flatMap((row) => row.values)).not.toContain('as usual');
});
