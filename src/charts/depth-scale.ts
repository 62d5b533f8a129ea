import { formatGiven } from '../ui/format';

export type DepthScaleKind = 'linear' | 'log';

export interface DepthTick {
  /** m */
  depth: number;
  y: number;
  label: string;
}

/** Depth down a drawing: px from its top. */
export interface DepthScale {
  kind: DepthScaleKind;
  maxDepth: number;
  height: number;
  yOf: (depth: number) => number;
  depthAt: (y: number) => number;
  ticks: readonly DepthTick[];
}

const LEAST_TICK_GAP = 46;

/** The first `minDepth` metres of a log scale are one stretch of no length: depth 0 has no logarithm. */
export function depthScale(
  kind: DepthScaleKind,
  { minDepth, maxDepth }: { minDepth: number; maxDepth: number },
  height: number,
): DepthScale {
  return kind === 'linear' ? linearScale(maxDepth, height) : logScale(minDepth, maxDepth, height);
}

function linearScale(maxDepth: number, height: number): DepthScale {
  const yOf = (depth: number) => (Math.min(Math.max(depth, 0), maxDepth) / maxDepth) * height;
  const step = roundStep((maxDepth * LEAST_TICK_GAP) / Math.max(height, 1));
  const count = Math.floor(maxDepth / step + 1e-9);
  const ticks = Array.from({ length: count + 1 }, (_, index) => tickAt(index * step, yOf));
  return { kind: 'linear', maxDepth, height, yOf, depthAt: (y) => (y / height) * maxDepth, ticks };
}

function logScale(minDepth: number, maxDepth: number, height: number): DepthScale {
  const span = Math.log(maxDepth / minDepth);
  const yOf = (depth: number) =>
    (Math.log(Math.min(Math.max(depth, minDepth), maxDepth) / minDepth) / span) * height;
  const ticks: DepthTick[] = [];
  const first = Math.floor(Math.log10(minDepth));
  for (let decade = first; 10 ** decade <= maxDepth; decade++) {
    for (const digit of [1, 2, 5]) {
      const depth = digit * 10 ** decade;
      const last = ticks.at(-1);
      const hasRoom = last === undefined || yOf(depth) - last.y >= LEAST_TICK_GAP / 2.5;
      if (depth >= minDepth && depth <= maxDepth && hasRoom) ticks.push(tickAt(depth, yOf));
    }
  }
  return {
    kind: 'log',
    maxDepth,
    height,
    yOf,
    depthAt: (y) => minDepth * Math.exp((y / height) * span),
    ticks,
  };
}

/** The next of 1, 2, 5, 10, … at or above a value. */
function roundStep(least: number): number {
  const decade = 10 ** Math.floor(Math.log10(least));
  return decade * ([1, 2, 5, 10].find((digit) => digit * decade >= least * (1 - 1e-9)) ?? 10);
}

function tickAt(depth: number, yOf: (depth: number) => number): DepthTick {
  return { depth, y: yOf(depth), label: formatGiven(Number(depth.toPrecision(6))) };
}
