import { isHeldRange } from '../../inversion/held-range';
import { formatLength, formatRange, formatResistivity, NOT_BOUNDED, withUnit } from '../ui/format';
import {
  boundaryDepths,
  type BoreholeLog,
  type Bounds,
  type GroundColumn,
  type HeldValue,
} from './chart-data';
import { rampColor } from './resistivity-ramp';

/** A boundary whose 95 % interval spans more than this factor is called unresolved. */
const UNRESOLVED_FACTOR = 10;

export interface GroundBoundary {
  /** Between bed `index` and the one below it. */
  index: number;
  depth: number;
  low: number | null;
  high: number | null;
  /** "3.20–8.90 m", "at least 3.20 m", "not bounded". Empty without intervals, and where all above is held. */
  rangeText: string;
  unresolved: boolean;
}

export interface GroundBed {
  index: number;
  top: number;
  /** null = the half-space. */
  base: number | null;
  resistivity: number;
  color: string;
  rangeText: string;
  note: string | null;
  /** Which of its two values a fit holds. */
  held: Record<HeldValue['on'], boolean>;
}

export function groundBoundaries(column: GroundColumn): GroundBoundary[] {
  return boundaryDepths(column.earth).map((depth, index) => {
    const bounds: Bounds | undefined = column.intervals?.depth[index];
    const [low, high] = bounds ?? [null, null];
    const range = rangeOf(bounds);
    const isWide = low !== null && high !== null && high / Math.max(low, 1e-9) > UNRESOLVED_FACTOR;
    return {
      index,
      depth,
      low: bounds ? low : depth,
      high: bounds ? high : depth,
      rangeText: range === '' || range === NOT_BOUNDED ? range : withUnit(range, 'm'),
      unresolved: bounds !== undefined && ((low === null && high === null) || isWide),
    };
  });
}

export function groundBeds(column: GroundColumn): GroundBed[] {
  const depths = boundaryDepths(column.earth);
  return column.earth.resistivity.map((resistivity, index) => {
    const bounds = column.intervals?.resistivity[index];
    return {
      index,
      top: index === 0 ? 0 : (depths[index - 1] ?? 0),
      base: depths[index] ?? null,
      resistivity,
      color: rampColor(resistivity),
      rangeText: rangeOf(bounds),
      note: column.bedNotes?.[index] ?? null,
      held: {
        resistivity: isHeld(column, 'resistivity', index),
        thickness: isHeld(column, 'thickness', index),
      },
    };
  });
}

const rangeOf = (bounds: Bounds | undefined): string =>
  bounds === undefined || isHeldRange(bounds) ? '' : formatRange(bounds);

const isHeld = ({ held = [] }: GroundColumn, on: HeldValue['on'], index: number): boolean =>
  held.some((value) => value.on === on && value.index === index);

/** Names of the held values of a bed, as the place wants them. */
export const heldNames = ({ held }: GroundBed, names: Record<HeldValue['on'], string>): string[] =>
  (['resistivity', 'thickness'] as const).filter((on) => held[on]).map((on) => names[on]);

/** "Bed 2, 12.4 ohm metres, 3.1 to 9.0 m", with its interval and what holds it. */
export function bedSentence(bed: GroundBed): string {
  const place =
    bed.base === null
      ? `below ${formatLength(bed.top)} m`
      : `${formatLength(bed.top)} to ${formatLength(bed.base)} m`;
  const interval = bed.rangeText === '' ? '' : `, 95\u00a0% ${bed.rangeText.replace('–', ' to ')} ohm metres`;
  const note = bed.note ? `, ${bed.note}` : '';
  const held = heldNames(bed, { resistivity: ', resistivity held', thickness: ', thickness held' }).join('');
  return `Bed ${bed.index + 1}, ${formatResistivity(bed.resistivity)} ohm metres, ${place}${interval}${note}${held}`;
}

/** Depths that show every boundary with its interval, the depth of investigation and the boreholes. */
export function depthExtent(
  columns: readonly GroundColumn[],
  borehole: BoreholeLog | null,
): { minDepth: number; maxDepth: number } {
  const boundaries = columns.flatMap(groundBoundaries);
  const deepest = Math.max(
    1,
    ...boundaries.map(({ depth, high }) => Math.max(depth, Math.min(high ?? depth, depth * 2.5))),
  );
  const others = [
    ...columns.map((column) => column.depthOfInvestigation ?? 0),
    ...(borehole?.beds.map((bed) => bed.base) ?? []),
  ];
  const shallowest = Math.min(
    deepest,
    ...boundaries.map(({ depth, low }) => Math.max(low ?? depth, depth / 3)),
  );
  return {
    minDepth: Math.max(0.05, shallowest / 2),
    maxDepth: Math.max(deepest * 1.25, ...others.map((m) => m * 1.08)),
  };
}
