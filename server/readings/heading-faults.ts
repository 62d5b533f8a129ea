import type { ImportMapping, RowFault } from '../contract/readings';
import { cut } from './cut-text';
import { statedUnits, type FileTable } from './find-mapping';
import { unitKeyOf } from './sheet-headings';

/** Units in the headings of used columns that cannot be used, or that disagree with one another. */
export function headingFaults(table: FileTable, { columns }: ImportMapping): RowFault[] {
  const stated = statedUnits(table, columns);
  return columns.flatMap((column, i) => {
    const heading = table.found[i];
    if (column === null || heading?.column !== column) return [];
    const fault = { row: table.headerLine ?? 1, column: cut(table.headings[i] ?? '', 80) };
    if (heading.unit.kind === 'unusable')
      return [
        {
          ...fault,
          found: heading.unit.written,
          message: `is in ${heading.unit.written}, which this column cannot be`,
          allowed: ALLOWED_UNITS[unitKeyOf(column) ?? 'none'],
        },
      ];
    const key = unitKeyOf(column);
    if (!key || heading.unit.kind !== 'named' || heading.unit.unit === stated[key]) return [];
    return [
      {
        ...fault,
        found: heading.unit.unit,
        message: `is in ${heading.unit.unit}, and another column of the sheet in ${stated[key] ?? ''}`,
        allowed: 'one unit for all lengths',
      },
    ];
  });
}

const ALLOWED_UNITS = {
  length: 'm or ft',
  voltage: 'mV or V',
  current: 'mA or A',
  resistivity: 'Ω·m, Ω·cm or Ω·ft',
  standardError: '% or relative',
  none: 'Ω for a resistance, no unit for a count',
} as const;

/** Whether every used column that has a unit names the one that is used. */
export function areUnitsStated(table: FileTable, mapping: ImportMapping): boolean {
  const keys = mapping.columns.flatMap((column) => (column && unitKeyOf(column)) ?? []);
  const stated = statedUnits(table, mapping.columns);
  return keys.length > 0 && keys.every((key) => stated[key] === mapping.units[key]);
}
