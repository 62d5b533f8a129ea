import { formatGiven } from '../ui/format';

/** A stretch of a log axis: log10 of its ends. */
export interface LogRange {
  min: number;
  max: number;
}

export interface LogAxes {
  x: LogRange;
  y: LogRange;
  /** Length of a decade on both axes, px. */
  pixelsPerDecade: number;
}

/** Room around the data, in decades. */
const PADDING = 0.12;
/** A decade is never drawn longer than this, so that a flat short curve is not blown up, px. */
const LONGEST_DECADE = 340;

/**
 * Axis ranges in which a decade has the same length in x and in y: the data with a margin fill the tighter
 * direction, and the other is extended evenly on both sides. Values must be > 0; widths in px.
 */
export function squareLogAxes(
  xs: readonly number[],
  ys: readonly number[],
  width: number,
  height: number,
): LogAxes {
  const x = logExtent(xs);
  const y = logExtent(ys);
  const pixelsPerDecade = Math.min(width / (x.max - x.min), height / (y.max - y.min), LONGEST_DECADE);
  return {
    x: widen(x, width / pixelsPerDecade),
    y: widen(y, height / pixelsPerDecade),
    pixelsPerDecade,
  };
}

function logExtent(values: readonly number[]): LogRange {
  const logs = values.filter((value) => value > 0 && Number.isFinite(value)).map(Math.log10);
  if (logs.length === 0) return { min: 0, max: 2 };
  return { min: Math.min(...logs) - PADDING, max: Math.max(...logs) + PADDING };
}

function widen({ min, max }: LogRange, length: number): LogRange {
  const centre = (min + max) / 2;
  return { min: centre - length / 2, max: centre + length / 2 };
}

export interface LogTick {
  /** log10 of the value. */
  position: number;
  value: number;
  /** 1, 10, 100, … */
  isDecade: boolean;
}

/** Ticks at 1, 2 and 5 of each decade within a range. */
export function logTicks({ min, max }: LogRange): LogTick[] {
  const ticks: LogTick[] = [];
  for (let decade = Math.floor(min); decade <= Math.ceil(max); decade++) {
    for (const digit of [1, 2, 5]) {
      const position = decade + Math.log10(digit);
      if (position >= min - 1e-9 && position <= max + 1e-9)
        ticks.push({ position, value: digit * 10 ** decade, isDecade: digit === 1 });
    }
  }
  return ticks;
}

/** The ticks that have room for a number of `labelWidth` px; whole decades alone when they would collide. */
export function labelledTicks(range: LogRange, pixelsPerDecade: number, labelWidth: number): LogTick[] {
  const ticks = logTicks(range);
  const hasRoom = pixelsPerDecade * Math.log10(2) >= labelWidth;
  return hasRoom ? ticks : ticks.filter((tick) => tick.isDecade);
}

/** Number of a tick without trailing zeros: 0.5, 20, 1000, 10 000. */
export function tickLabel(position: number): string {
  return formatGiven(Number((10 ** position).toPrecision(3)));
}
