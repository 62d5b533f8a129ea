import type { GroundColumn } from './chart-data';
import type { DepthScale } from './depth-scale';
import { groundBeds, groundBoundaries } from './ground-profile';
import { overlaid } from './oklab';
import { rampColor } from './resistivity-ramp';

/** Most of a bed that may turn into its neighbour: of one that has a neighbour on one side, and of one between two. */
const SHARE_OF_OUTER_BED = 0.5;
const SHARE_OF_INNER_BED = 0.35;
/** A bed tints its neighbour no further than this many times its own height. */
const REACH_IN_HEIGHTS = 2;

/** Where the colour turns from one bed to the next, px down the drawing: from `top` through the best value at `y` to `base`. */
export interface SoftBoundary {
  top: number;
  y: number;
  base: number;
}

/**
 * The 95 % interval of each boundary as far as it may be drawn: whatever the doubt, the core of each bed keeps its own
 * colour, and a thin bed does not colour thick ones. The whole interval stands beside the bar.
 */
export function softBoundaries(column: GroundColumn, scale: DepthScale): SoftBoundary[] {
  const edges = groundBeds(column).map((bed) => ({
    top: scale.yOf(bed.top),
    base: bed.base === null ? scale.height : scale.yOf(bed.base),
  }));
  const heights = edges.map(({ top, base }) => base - top);
  const shareOf = (bed: number) =>
    bed === 0 || bed === heights.length - 1 ? SHARE_OF_OUTER_BED : SHARE_OF_INNER_BED;
  return groundBoundaries(column).map(({ index, depth, low, high }) => {
    const y = scale.yOf(depth);
    const [above = 0, below = 0] = [heights[index], heights[index + 1]];
    const reach = REACH_IN_HEIGHTS * Math.min(above, below);
    const up = Math.min(y - scale.yOf(low ?? 0), above * shareOf(index), reach);
    const down = Math.min(
      (high === null ? scale.height : scale.yOf(high)) - y,
      below * shareOf(index + 1),
      reach,
    );
    return { top: y - Math.max(0, up), y, base: y + Math.max(0, down) };
  });
}

/** How far the ground has turned into the lower bed: 0 above the boundary's stretch, ½ at its best value, 1 below. */
export function shareBelow(y: number, boundary: SoftBoundary): number {
  if (y <= boundary.y) {
    const length = boundary.y - boundary.top;
    return length <= 0 ? Number(y >= boundary.y) : Math.max(0, (y - boundary.top) / length) / 2;
  }
  const length = boundary.base - boundary.y;
  return length <= 0 ? 1 : 0.5 + Math.min(1, (y - boundary.y) / length) / 2;
}

export interface ProfileStop {
  /** 0 at the top of the drawing, 1 at its foot. */
  offset: number;
  color: string;
  opacity: number;
}

/** Half the distance between the two colours of a step, px. */
const STEP = 0.01;

/** Colours down a column: soft where its boundaries are, fading to the paper below the depth of investigation. */
export function profileStops(column: GroundColumn, scale: DepthScale, count = 240): ProfileStop[] {
  const boundaries = softBoundaries(column, scale);
  const places = [
    ...Array.from({ length: count + 1 }, (_, index) => (index / count) * scale.height),
    ...boundaries.flatMap(({ top, y, base }) => (base > top ? [top, y, base] : [y - STEP, y + STEP])),
  ];
  const ordered = [...new Set(places.map((y) => Number(y.toFixed(3))))]
    .filter((y) => y >= 0 && y <= scale.height)
    .toSorted((a, b) => a - b);
  return ordered.map((y) => ({ offset: y / scale.height, ...fillAt(column, scale, boundaries, y) }));
}

/** The colour that is seen at a height of the column, on a paper. */
export function colorBehind(column: GroundColumn, scale: DepthScale, y: number, paper: string): string {
  const { color, opacity } = fillAt(column, scale, softBoundaries(column, scale), y);
  return overlaid(color, opacity, paper);
}

function fillAt(
  column: GroundColumn,
  scale: DepthScale,
  boundaries: readonly SoftBoundary[],
  y: number,
): { color: string; opacity: number } {
  const logs = column.earth.resistivity.map(Math.log);
  const log = boundaries.reduce((sum, boundary, index) => {
    const step = (logs[index + 1] ?? 0) - (logs[index] ?? 0);
    return sum + step * shareBelow(y, boundary);
  }, logs[0] ?? 0);
  return {
    color: rampColor(Math.exp(log)),
    opacity: opacityAt(scale.depthAt(y), column.depthOfInvestigation ?? null, scale.maxDepth),
  };
}

/** Opacity left where the data say nothing any more. */
const FAINTEST = 0.16;

function opacityAt(depth: number, depthOfInvestigation: number | null, maxDepth: number): number {
  if (depthOfInvestigation === null || depth <= depthOfInvestigation) return 1;
  const fadeLength = Math.max(maxDepth - depthOfInvestigation, depthOfInvestigation * 0.1);
  return 1 - (1 - FAINTEST) * Math.min(1, (depth - depthOfInvestigation) / fadeLength);
}
