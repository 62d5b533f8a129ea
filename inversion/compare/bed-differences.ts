import { hasCells } from '../fit/smooth/has-cells';
import { isHeldRange } from '../held-range';
import type { FitResult, Interval } from '../types';

export type BedQuantity = 'resistivity' | 'thickness' | 'depth' | 'conductance' | 'resistance';

/** How one quantity of one bed differs between two results. */
export interface BedDifference {
  bed: number;
  quantity: BedQuantity;
  unit: 'Ω·m' | 'm' | 'S' | 'Ω·m²';
  first: number;
  second: number;
  /** second / first */
  ratio: number;
  /** whether either result holds the value; its interval then says nothing of the readings */
  isHeld: boolean;
  /** whether the 95 % intervals share a value; null where none is computed (S, T) */
  intervalsOverlap: boolean | null;
}

export function overlap([lowA, highA]: Interval, [lowB, highB]: Interval): boolean {
  return (lowA ?? 0) <= (highB ?? Infinity) && (lowB ?? 0) <= (highA ?? Infinity);
}

function depths(result: FitResult): number[] {
  let base = 0;
  return result.earth.thickness.map((h) => (base += h));
}

interface Column {
  readonly quantity: BedQuantity;
  readonly unit: BedDifference['unit'];
  readonly values: (result: FitResult) => readonly number[];
  readonly intervals: ((result: FitResult) => readonly Interval[]) | null;
}

const COLUMNS: readonly Column[] = [
  {
    quantity: 'resistivity',
    unit: 'Ω·m',
    values: (result) => result.earth.resistivity,
    intervals: (result) => result.intervals.resistivity,
  },
  {
    quantity: 'thickness',
    unit: 'm',
    values: (result) => result.earth.thickness,
    intervals: (result) => result.intervals.thickness,
  },
  { quantity: 'depth', unit: 'm', values: depths, intervals: (result) => result.intervals.depth },
  {
    quantity: 'conductance',
    unit: 'S',
    values: (result) => result.darZarrouk.conductanceS,
    intervals: null,
  },
  {
    quantity: 'resistance',
    unit: 'Ω·m²',
    values: (result) => result.darZarrouk.resistanceOhmM2,
    intervals: null,
  },
];

/** Cells are no beds, so nothing of theirs is set against a bed. */
export const comparable = (a: FitResult, b: FitResult): boolean => !hasCells(a) && !hasCells(b);

export function bedDifferences(a: FitResult, b: FitResult): BedDifference[] {
  if (!comparable(a, b)) return [];
  return COLUMNS.flatMap(({ quantity, unit, values, intervals }) => {
    const first = values(a);
    const second = values(b);
    const shared = Math.min(first.length, second.length);
    return Array.from({ length: shared }, (_, bed) => {
      const ranges = intervals ? [intervals(a)[bed]!, intervals(b)[bed]!] : [];
      return {
        bed,
        quantity,
        unit,
        first: first[bed]!,
        second: second[bed]!,
        ratio: second[bed]! / first[bed]!,
        isHeld: ranges.some(isHeldRange),
        intervalsOverlap: ranges[0] && ranges[1] ? overlap(ranges[0], ranges[1]) : null,
      };
    });
  }).sort((x, y) => x.bed - y.bed);
}
