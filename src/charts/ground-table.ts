import { formatLength, formatResistivity } from '../ui/format';
import type { ChartColumn, ChartTable } from './chart-table';
import type { GroundColumn } from './chart-data';
import { groundBeds, groundBoundaries, heldNames } from './ground-profile';

/** Beds of one or several grounds with their 95 % intervals, for the table and the CSV. */
export function groundTable(columns: readonly GroundColumn[]): ChartTable {
  const several = columns.length > 1;
  const head: ChartColumn[] = [
    ...(several ? [{ label: 'Run' }] : []),
    { label: 'Bed' },
    { label: 'Resistivity', unit: 'Ω·m', format: formatResistivity },
    { label: '95 %, low', unit: 'Ω·m', format: formatResistivity },
    { label: '95 %, high', unit: 'Ω·m', format: formatResistivity },
    { label: 'Top', unit: 'm', format: formatLength },
    { label: 'Base', unit: 'm', format: formatLength },
    { label: 'Base, low', unit: 'm', format: formatLength },
    { label: 'Base, high', unit: 'm', format: formatLength },
    { label: 'Note' },
  ];
  const rows = columns.flatMap((column) => {
    const boundaries = groundBoundaries(column);
    return groundBeds(column).map((bed) => {
      const [low = null, high = null] = column.intervals?.resistivity[bed.index] ?? [];
      const boundary = column.intervals ? boundaries[bed.index] : undefined;
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
        boundary?.low ?? null,
        boundary?.high ?? null,
        note,
      ];
    });
  });
  return { columns: head, rows };
}
