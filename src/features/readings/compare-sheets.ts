import { formatSheetRow } from '../../../server/contract/field-sheet';
import type { Reading, SheetRow, SheetUnits } from '../../../server/contract/readings';

export interface SheetDifference {
  /** Where the electrodes stand, as written. */
  spacing: string;
  mine: SheetRow | null;
  theirs: SheetRow | null;
}

export interface SheetComparison {
  differences: readonly SheetDifference[];
  same: number;
}

/** Two sets of readings, paired by their electrodes and the order among equals; what both say alike is only counted. */
export function compareSheets(
  mine: readonly Reading[],
  theirs: readonly Reading[],
  units: SheetUnits,
): SheetComparison {
  const [own, other] = [byPlace(mine, units), byPlace(theirs, units)];
  const differences: SheetDifference[] = [];
  let same = 0;
  for (const key of new Set([...own.keys(), ...other.keys()])) {
    const [left, right] = [own.get(key) ?? null, other.get(key) ?? null];
    if (left && right && left.text === right.text) same += 1;
    else
      differences.push({
        spacing: (left ?? right)?.spacing ?? '',
        mine: left?.row ?? null,
        theirs: right?.row ?? null,
      });
  }
  return { differences, same };
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
