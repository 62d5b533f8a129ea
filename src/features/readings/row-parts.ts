import type { SheetColumn, SheetRow } from '../../../server/contract/readings';

/** One piece of a row in words, with how it stood before where it was changed. */
export interface RowPart {
  text: string;
  /** "was 12.3", "added"; null = as before, or nothing is known of before. */
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
export function rowParts(row: SheetRow | null, before: SheetRow | null | undefined): RowPart[] {
  if (row === null) return [{ text: 'not there', change: before ? 'taken out' : null }];
  const values = VALUES.flatMap(([column, name]): RowPart[] => {
    const [now, then] = [row.cells[column], before?.cells[column]];
    const change = before && now !== then ? wasText(then) : null;
    if (now === undefined && change === null) return [];
    return [{ text: [name, now ?? 'empty'].filter((word) => word !== '').join('\u00a0'), change }];
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

const wasText = (text: string | undefined): string => (text === undefined ? 'was empty' : `was ${text}`);
