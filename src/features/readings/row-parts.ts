import type { SheetColumn, SheetRow, SheetUnits } from '../../../server/contract/readings';
import { columnUnit } from '../../../server/contract/sheet-columns';
import { withUnit } from '../../ui/format';

/** One piece of a row in words, with how it stood before where it was changed. */
export interface RowPart {
  text: string;
  /** "was 12.3 mV", "added"; null = as before, or nothing is known of before. */
  change: string | null;
}

const VALUES: readonly (readonly [SheetColumn, string])[] = [
  ['voltage', 'V'],
  ['current', 'I'],
  ['resistance', 'R'],
  ['apparentResistivity', 'ρa'],
  ['standardError', 'error'],
  ['remark', ''],
];

/** A row in words beside the same row as it stood before: null = it was not there, undefined = not known. */
export function rowParts(
  row: SheetRow | null,
  before: SheetRow | null | undefined,
  units: SheetUnits,
): RowPart[] {
  if (row === null) return [{ text: 'not there', change: before ? 'taken out' : null }];
  const values = VALUES.flatMap(([column, name]): RowPart[] => {
    const [now, then] = [row.cells[column], before?.cells[column]];
    const change = before && now !== then ? `was ${written(then, column, units)}` : null;
    if (now === undefined && change === null) return [];
    const words = [name, written(now, column, units)].filter((word) => word !== '');
    return [{ text: words.join('\u00a0'), change }];
  });
  const added: RowPart[] = before === null ? [{ text: '', change: 'added' }] : [];
  return [...values, ...leftOut(row.excluded, before), ...added];
}

function leftOut(reason: string | null, before: SheetRow | null | undefined): RowPart[] {
  const isChanged = before ? before.excluded !== reason : false;
  if (reason === null) return isChanged ? [{ text: 'kept', change: 'was left out' }] : [];
  const was = before?.excluded ?? null;
  return [
    { text: `left out: ${reason}`, change: !isChanged ? null : was === null ? 'was kept' : `was: ${was}` },
  ];
}

function written(text: string | undefined, column: SheetColumn, units: SheetUnits): string {
  if (text === undefined) return 'empty';
  const unit = columnUnit(column, units);
  return unit === '' ? text : withUnit(text, unit);
}
