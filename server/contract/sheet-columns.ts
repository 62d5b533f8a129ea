import type { SheetColumn, SheetUnits } from './readings';
import { SPACING_COLUMNS, VALUE_COLUMNS } from './readings';
import type { SpreadType } from './spread';

/** How a column is called, and which of the units it is written in; '' = a plain number or text. */
export const SHEET_COLUMN_NAMES: Record<SheetColumn, string> = {
  halfAB: 'AB/2',
  halfMN: 'MN/2',
  spacing: 'a',
  dipole: 'a',
  n: 'n',
  am: 'AM',
  an: 'AN',
  bm: 'BM',
  bn: 'BN',
  voltage: 'V',
  current: 'I',
  resistance: 'R',
  apparentResistivity: 'ρa',
  standardError: 'error',
  remark: 'remark',
};

/** The columns of a Field sheet of this spread, in the order in which a crew writes them. */
export const sheetColumnsOf = (spreadType: SpreadType): readonly SheetColumn[] => [
  ...SPACING_COLUMNS[spreadType],
  ...VALUE_COLUMNS,
];

type Quantity = 'length' | 'voltage' | 'current' | 'resistance' | 'resistivity' | 'standardError' | 'count';

interface NumberColumn {
  readonly quantity: Quantity;
  /** of the stored value, in stored units */
  readonly low: number;
  readonly high: number;
  /** the low end itself is refused */
  readonly openLow: boolean;
}

const length: NumberColumn = { quantity: 'length', low: 0, high: 1e6, openLow: true };

/** What a number may be, in stored units (m, mV, mA, Ω, Ω·m, relative). */
export const NUMBER_COLUMNS: Record<Exclude<SheetColumn, 'remark'>, NumberColumn> = {
  halfAB: length,
  halfMN: length,
  spacing: length,
  dipole: length,
  n: { quantity: 'count', low: 0, high: 1000, openLow: true },
  am: length,
  an: length,
  bm: length,
  bn: length,
  voltage: { quantity: 'voltage', low: -1e7, high: 1e7, openLow: false },
  current: { quantity: 'current', low: -1e6, high: 1e6, openLow: false },
  resistance: { quantity: 'resistance', low: -1e9, high: 1e9, openLow: false },
  apparentResistivity: { quantity: 'resistivity', low: 0, high: 1e9, openLow: true },
  standardError: { quantity: 'standardError', low: 0, high: 1, openLow: false },
};
export type NumberColumnName = keyof typeof NUMBER_COLUMNS;

const LENGTH_M = { m: 1, ft: 0.3048 } as const;
const RESISTIVITY_OHM_M = { 'ohm-m': 1, 'ohm-cm': 0.01, 'ohm-ft': 0.3048 } as const;
const RESISTIVITY_NAMES = { 'ohm-m': 'Ω·m', 'ohm-cm': 'Ω·cm', 'ohm-ft': 'Ω·ft' } as const;

/** The unit that a column is written in, as shown; '' where it has none. */
export function columnUnit(column: SheetColumn, units: SheetUnits): string {
  if (column === 'remark') return '';
  const { quantity } = NUMBER_COLUMNS[column];
  if (quantity === 'length') return units.length;
  if (quantity === 'voltage') return units.voltage;
  if (quantity === 'current') return units.current;
  if (quantity === 'resistance') return 'Ω';
  if (quantity === 'resistivity') return RESISTIVITY_NAMES[units.resistivity];
  if (quantity === 'standardError') return units.standardError === 'percent' ? '%' : '';
  return '';
}

/** Stored value = written value × this. */
export function columnScale(column: NumberColumnName, units: SheetUnits): number {
  const { quantity } = NUMBER_COLUMNS[column];
  if (quantity === 'length') return LENGTH_M[units.length];
  if (quantity === 'voltage') return units.voltage === 'V' ? 1000 : 1;
  if (quantity === 'current') return units.current === 'A' ? 1000 : 1;
  if (quantity === 'resistivity') return RESISTIVITY_OHM_M[units.resistivity];
  if (quantity === 'standardError') return units.standardError === 'percent' ? 0.01 : 1;
  return 1;
}
