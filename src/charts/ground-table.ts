import { isHeldRange } from '../../inversion/held-range';
import { formatLength, formatResistivity } from '../ui/format';
import type { ChartColumn, ChartTable } from './chart-table';
import type { Bounds, GroundColumn } from './chart-data';
import { groundBeds, groundBoundaries, heldNames } from './ground-profile';

const NONE: Bounds = [null, null];

/** The ends that were found; a held value has none. */
const told = (bounds: Bounds = NONE): Bounds => (isHeldRange(bounds) ? NONE : bounds);

/** What a row of the table is. */
function unitOf(columns: readonly GroundColumn[]): string {
  if (columns.every((column) => column.isCells)) return 'Cell';
  return columns.some((column) => column.isCells) ? 'Bed or cell' : 'Bed';
}

/** Beds of one or several grounds with their 95 % intervals, for the table and the CSV. */
export function groundTable(columns: readonly GroundColumn[]): ChartTable {
  const several = columns.length > 1;
  const head: ChartColumn[] = [
    ...(several ? [{ label: 'Run' }] : []),
    { label: unitOf(columns) },
    { label: 'Resistivity', unit: 'Ω·m', format: formatResistivity },
    { label: '95\u00a0%, low', unit: 'Ω·m', format: formatResistivity },
    { label: '95\u00a0%, high', unit: 'Ω·m', format: formatResistivity },
    { label: 'Top', unit: 'm', format: formatLength },
    { label: 'Base', unit: 'm', format: formatLength },
    { label: 'Base, low', unit: 'm', format: formatLength },
    { label: 'Base, high', unit: 'm', format: formatLength },
    { label: 'Note' },
  ];
  const rows = columns.flatMap((column) => {
    const boundaries = groundBoundaries(column);
    return groundBeds(column).map((bed) => {
      const [low, high] = told(column.intervals?.resistivity[bed.index]);
      const boundary = boundaries[bed.index];
      const [highest, deepest] = boundary && column.intervals ? told([boundary.low, boundary.high]) : NONE;
      const held = heldNames(bed, { resistivity: 'ρ held', thickness: 'h held' });
      const note = [...(bed.note === null ? [] : [bed.note]), ...held].join(', ');
      return [
        ...(several ? [column.letter || column.name] : []),
        bed.index + 1,
        bed.resistivity,
        low,
        high,
        bed.top,
        bed.base,
        highest,
        deepest,
        note,
      ];
    });
  });
  return { columns: head, rows };
}
