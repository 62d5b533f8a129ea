import { BRANCH_ROOM } from './curve-branches';

const LEFT = 58;
const RIGHT = 30;
const TOP = 12;
const AXIS_ROOM = 26;
const STRIP_HEIGHT = 76;
const FOOT = 42;
const STRIP_FOOT = 24;

export interface CurveLayout {
  plot: { left: number; top: number; width: number; height: number };
  strip: { left: number; top: number; width: number; height: number } | null;
}

/** What stands above and below the plot, and needs room there. */
export interface CurveParts {
  hasStrip: boolean;
  hasBranches?: boolean;
}

/** Boxes of the curve and of the residual strip under it; both share left edge and width. */
export function curveLayout(
  width: number,
  height: number,
  { hasStrip, hasBranches = false }: CurveParts,
): CurveLayout {
  const top = TOP + (hasBranches ? BRANCH_ROOM : 0);
  const plotWidth = Math.max(60, width - LEFT - RIGHT);
  const below = hasStrip ? AXIS_ROOM + STRIP_HEIGHT + STRIP_FOOT : FOOT;
  const plotHeight = Math.max(60, height - top - below);
  const plot = { left: LEFT, top, width: plotWidth, height: plotHeight };
  const strip = { left: LEFT, top: top + plotHeight + AXIS_ROOM, width: plotWidth, height: STRIP_HEIGHT };
  return { plot, strip: hasStrip ? strip : null };
}
