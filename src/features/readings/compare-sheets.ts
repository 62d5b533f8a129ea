import { formatSheetRow } from '../../../server/contract/field-sheet';
import type { Reading, SheetRow, SheetUnits } from '../../../server/contract/readings';

export interface SheetDifference {
  /** Where the electrodes stand, as written. */
  spacing: string;
  mine: SheetRow | null;
  theirs: SheetRow | null;
  /** As both began with it: null = it was not there, undefined = not known. */
  base: SheetRow | null | undefined;
  /** Who changed it since then; null = not known. */
  changedBy: 'me' | 'them' | 'both' | null;
}

export interface SheetComparison {
  differences: readonly SheetDifference[];
  same: number;
}

/**
 * Two sets of readings, paired by their electrodes and the order among equals; what both say alike is only counted.
 * `base` are the readings that both were written over, where they are known.
 */
export function compareSheets(
  mine: readonly Reading[],
  theirs: readonly Reading[],
  units: SheetUnits,
  base: readonly Reading[] | null = null,
): SheetComparison {
  const [own, other] = [byPlace(mine, units), byPlace(theirs, units)];
  const origin = base && byPlace(base, units);
  const differences: SheetDifference[] = [];
  let same = 0;
  for (const key of new Set([...own.keys(), ...other.keys()])) {
    const [left, right] = [own.get(key) ?? null, other.get(key) ?? null];
    const before = origin && (origin.get(key) ?? null);
    if (left && right && left.text === right.text) same += 1;
    else
      differences.push({
        spacing: (left ?? right)?.spacing ?? '',
        mine: left?.row ?? null,
        theirs: right?.row ?? null,
        base: origin ? (before?.row ?? null) : undefined,
        changedBy: origin ? changedBy(left?.text, right?.text, before?.text) : null,
      });
  }
  return { differences, same };
}

/** The two differ, so at least one of them is not as before. */
function changedBy(
  mine: string | undefined,
  theirs: string | undefined,
  before: string | undefined,
): 'me' | 'them' | 'both' {
  if (mine === before) return 'them';
  return theirs === before ? 'me' : 'both';
}

interface PlacedRow {
  row: SheetRow;
  spacing: string;
  text: string;
}

function byPlace(readings: readonly Reading[], units: SheetUnits): Map<string, PlacedRow> {
  const placed = new Map<string, PlacedRow>();
  for (const reading of readings) {
    const row = formatSheetRow(reading, units);
    const spacing = spacingText(reading);
    let occurrence = 1;
    while (placed.has(`${spacing} #${occurrence}`)) occurrence += 1;
    placed.set(`${spacing} #${occurrence}`, { row, spacing, text: JSON.stringify(reading) });
  }
  return placed;
}

function spacingText(reading: Reading): string {
  const { type: _type, ...lengths } = reading.spread;
  return Object.values(lengths)
    .map((length) => (length === null ? '–' : String(length)))
    .join(' / ');
}
