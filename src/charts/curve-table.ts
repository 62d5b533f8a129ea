import {
  formatFixed,
  formatGivenLength,
  formatLength,
  formatRelativeError,
  formatResistivity,
} from '../ui/format';
import type { CurveLine, CurveReading } from './chart-data';
import type { ChartColumn, ChartTable } from './chart-table';

/** Spacings that the crew wrote down; any other axis is computed from them. */
const GIVEN_SPACINGS = ['AB/2', 'AO'];

/** Readings with what each line predicts there, for the table and the CSV of the curve. */
export function curveTable(
  readings: readonly CurveReading[],
  lines: readonly CurveLine[],
  spacingName: string,
): ChartTable {
  const [label = 'Spacing', unit = 'm'] = spacingName.split(', ');
  const told = lines
    .filter((line) => line.kind !== 'ghost' && (line.predicted ?? line.residuals) !== undefined)
    .toSorted((first, second) => first.letter.localeCompare(second.letter, 'en'));
  const nameOf = (line: CurveLine) => (line.letter === '' ? line.name : `run ${line.letter}`);
  const hasMN = readings.some((reading) => reading.halfMN !== undefined);
  const columns: ChartColumn[] = [
    { label, unit, format: GIVEN_SPACINGS.includes(label) ? formatGivenLength : formatLength },
    ...(hasMN ? [{ label: 'MN/2', unit: 'm', format: formatGivenLength }] : []),
    { label: 'Measured', unit: 'Ω·m', format: formatResistivity },
    { label: 'Standard error', unit: 'relative', format: formatRelativeError },
    { label: 'Used' },
    ...told.flatMap((line): ChartColumn[] => [
      { label: `Predicted, ${nameOf(line)}`, unit: 'Ω·m', format: formatResistivity },
      { label: `Residual, ${nameOf(line)}`, unit: 'σ', format: (value) => formatFixed(value, 2) },
    ]),
  ];
  const rows = readings.map((reading, index) => [
    reading.spacing,
    ...(hasMN ? [reading.halfMN ?? null] : []),
    reading.apparentResistivity,
    reading.relativeError,
    reading.excluded ? `left out${reading.reason ? `: ${reading.reason}` : ''}` : 'yes',
    ...told.flatMap((line) => [line.predicted?.[index] ?? null, line.residuals?.[index] ?? null]),
  ]);
  return { columns, rows };
}
