import type { ReactNode } from 'react';
import { formatLength, formatResistivity, withUnit } from '../ui/format';
import type { GroundColumn } from './chart-data';
import { haloOf, MONO, SANS, type ChartPalette } from './chart-palette';
import type { DepthScale } from './depth-scale';
import { textWidth, wrapText } from './fit-text';
import { LEAST_NUMBER_HEIGHT } from './ground-bar';
import { groundBeds, groundBoundaries } from './ground-profile';
import { placeLabels } from './place-labels';

interface GroundLabel {
  key: string;
  y: number;
  /** Numbers, one or two lines of them. */
  strong: readonly string[];
  /** The bed is so thin that only a line leads to its words. */
  isThin: boolean;
  note: string | null;
  kind: 'bed' | 'boundary';
}

const LINE = 15;
const GAP = 4;

export interface GroundLabelsProps {
  column: GroundColumn;
  scale: DepthScale;
  /** Left edge of the words; the bar ends at `barEnd`. */
  x: number;
  barEnd: number;
  /** Room for the words, px; longer notes run over several lines. */
  width: number;
  palette: ChartPalette;
}

/** Intervals of beds and boundaries beside the bar, kept apart, each tied to its place by a thin line. */
export function GroundLabels({ column, scale, x, barEnd, width, palette }: GroundLabelsProps): ReactNode {
  const labels = groundLabels(column, scale, width);
  const notes = labels.map(({ note }) => (note ? wrapText(note, width) : []));
  const lines = labels.map(({ strong }, index) => strong.length + (notes[index]?.length ?? 0));
  const heights = lines.map((count) => count * LINE + GAP);
  const middles = placeLabels(
    labels.map((label, index) => ({ y: label.y, height: heights[index] ?? LINE })),
    -8,
    scale.height + 12,
  );
  // A range that means little is muted; the number of a thin bed is its value and stays.
  const lookOf = (label: GroundLabel, line: number) => {
    const isValue = label.isThin && line === 0;
    if (column.isRejected && !isValue) return { fill: palette.muted, fontWeight: 400 };
    return { fill: label.kind === 'boundary' ? palette.copper : palette.ink, fontWeight: 600 };
  };
  return (
    <g aria-hidden>
      {labels.map((label, index) => {
        const middle = middles[index] ?? label.y;
        const first = middle - (((lines[index] ?? 1) - 1) * LINE) / 2;
        return (
          <g key={label.key}>
            {label.isThin || Math.abs(middle - label.y) > 6 ? (
              <polyline
                points={`${label.isThin ? barEnd : barEnd + 9},${label.y} ${x - 9},${first} ${x - 4},${first}`}
                fill="none"
                stroke={label.isThin ? palette.muted : palette.ruleStrong}
              />
            ) : null}
            {label.strong.map((words, line) => (
              <text
                key={words}
                x={x}
                y={first + line * LINE}
                dy="0.35em"
                fontSize={12}
                fontFamily={MONO}
                {...lookOf(label, line)}
                {...haloOf(palette)}
              >
                {words}
              </text>
            ))}
            {notes[index]?.map((words, line) => (
              <text
                key={line}
                x={x}
                y={first + (label.strong.length + line) * LINE}
                dy="0.35em"
                fontSize={12}
                fontFamily={SANS}
                fill={palette.muted}
                {...haloOf(palette)}
              >
                {words}
              </text>
            ))}
          </g>
        );
      })}
    </g>
  );
}

/** Least room for the words of a ground, px: its numbers whole, and of its notes a dozen letters. */
export function labelRoom(column: GroundColumn, scale: DepthScale): number {
  const widths = groundLabels(column, scale, 0).map(({ strong, note }) =>
    Math.max(
      ...strong.map((words) => textWidth(words, 'mono')),
      textWidth((note ?? '').slice(0, 12), 'sans'),
    ),
  );
  return Math.max(0, ...widths);
}

/**
 * What stands beside the bar: for each bed its interval (and its number where the bed is too thin), then its base.
 * Number and interval stand in one line where `room`, px, lets them.
 */
export function groundLabels(column: GroundColumn, scale: DepthScale, room: number): GroundLabel[] {
  if (column.isCells) return [];
  const groundOf = groundBeds(column);
  const isThicknessHeld = groundOf.map((bed) => bed.held.thickness);
  const beds = groundOf.flatMap((bed): GroundLabel[] => {
    const top = scale.yOf(bed.top);
    const base = bed.base === null ? scale.height : scale.yOf(bed.base);
    const isThin = base - top < LEAST_NUMBER_HEIGHT;
    const words = [isThin ? formatResistivity(bed.resistivity) : '', bed.rangeText].filter(
      (text) => text !== '',
    );
    const joined = words.join(' · ');
    const fits = !column.isRejected && textWidth(joined, 'mono') <= room;
    const note = [bed.held.resistivity ? 'ρ held' : null, bed.note]
      .filter((word) => word !== null)
      .join(', ');
    if (words.length === 0 && note === '') return [];
    return [
      {
        key: `bed ${bed.index}`,
        y: (top + base) / 2,
        strong: fits && words.length > 0 ? [joined] : words,
        isThin,
        note: note === '' ? null : note,
        kind: 'bed',
      },
    ];
  });
  const bases = groundBoundaries(column).map((boundary): GroundLabel => ({
    key: `base ${boundary.index}`,
    y: scale.yOf(boundary.depth),
    strong: [boundary.rangeText === '' ? withUnit(formatLength(boundary.depth), 'm') : boundary.rangeText],
    isThin: false,
    note: boundaryNote(boundary.unresolved, isThicknessHeld[boundary.index] ?? false),
    kind: 'boundary',
  }));
  return [...beds, ...bases].toSorted((first, second) => first.y - second.y);
}

function boundaryNote(isUnresolved: boolean, isThicknessHeld: boolean): string | null {
  const words = [isThicknessHeld ? 'h held' : null, isUnresolved ? 'unresolved' : null];
  return words.filter((word) => word !== null).join(', ') || null;
}
