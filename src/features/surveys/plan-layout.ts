export interface PlanPoint {
  xM: number;
  yM: number;
}

export interface PlanLayout {
  /** Plan metres to pixels; y grows upwards on the plan and downwards on the page. */
  toPage: (point: PlanPoint) => { x: number; y: number };
  scaleBar: { lengthM: number; pixels: number };
}

export interface PlanBox {
  width: number;
  height: number;
  margin: number;
}

/** A single point has no extent; around it at least this much ground is shown. */
const LEAST_SPAN_M = 10;
const SCALE_BAR_SHARE = 0.3;

const HEIGHT_PX = { least: 300, most: 620 };
const USUAL_SHAPE = 0.62;

/** Tall enough that the points fill the width, within what a screen holds: a narrow plan needs every pixel of it. */
export function planHeight(points: readonly PlanPoint[], { width, margin }: Omit<PlanBox, 'height'>): number {
  const span = (values: readonly number[]) => Math.max(LEAST_SPAN_M, most(values) - least(values));
  const shape = span(points.map(({ yM }) => yM)) / span(points.map(({ xM }) => xM));
  const wanted = Math.max(width * USUAL_SHAPE, shape * (width - 2 * margin) + 2 * margin);
  return Math.round(Math.min(HEIGHT_PX.most, Math.max(HEIGHT_PX.least, wanted)));
}

/** Fits the points into the box with one scale for both axes, centred. */
export function planLayout(points: readonly PlanPoint[], box: PlanBox): PlanLayout {
  const xs = points.map((point) => point.xM);
  const ys = points.map((point) => point.yM);
  const [left, right] = [least(xs), most(xs)];
  const [bottom, top] = [least(ys), most(ys)];
  const inner = { width: box.width - 2 * box.margin, height: box.height - 2 * box.margin };
  const pixelsPerM = Math.min(
    inner.width / Math.max(LEAST_SPAN_M, right - left),
    inner.height / Math.max(LEAST_SPAN_M, top - bottom),
  );
  const centre = { xM: (left + right) / 2, yM: (bottom + top) / 2 };
  const lengthM = roundDown(Math.max(0.001, (inner.width * SCALE_BAR_SHARE) / pixelsPerM));
  return {
    toPage: ({ xM, yM }) => ({
      x: box.width / 2 + (xM - centre.xM) * pixelsPerM,
      y: box.height / 2 - (yM - centre.yM) * pixelsPerM,
    }),
    scaleBar: { lengthM, pixels: lengthM * pixelsPerM },
  };
}

/** The greatest of 1, 2, 5 × 10ⁿ that is not above `length`. */
export function roundDown(length: number): number {
  const decade = 10 ** Math.floor(Math.log10(length) + 1e-9);
  const mantissa = length / decade;
  const step = mantissa >= 5 ? 5 : mantissa >= 2 ? 2 : 1;
  return Number((step * decade).toPrecision(1));
}

const least = (values: readonly number[]): number => values.reduce((a, b) => Math.min(a, b), Infinity);
const most = (values: readonly number[]): number => values.reduce((a, b) => Math.max(a, b), -Infinity);

/** Points of one line in the order in which they stand along it: by their place on its longest extent. */
export function alongLine<T extends PlanPoint>(points: readonly T[]): T[] {
  if (points.length < 2) return [...points];
  const mean = (pick: (point: T) => number) =>
    points.reduce((sum, point) => sum + pick(point), 0) / points.length;
  const [mx, my] = [mean((point) => point.xM), mean((point) => point.yM)];
  const moment = (product: (dx: number, dy: number) => number) =>
    points.reduce((sum, point) => sum + product(point.xM - mx, point.yM - my), 0);
  const [sxx, syy, sxy] = [moment((dx) => dx * dx), moment((_, dy) => dy * dy), moment((dx, dy) => dx * dy)];
  const direction = Math.atan2(2 * sxy, sxx - syy) / 2;
  const place = (point: T) => (point.xM - mx) * Math.cos(direction) + (point.yM - my) * Math.sin(direction);
  return points.toSorted((a, b) => place(a) - place(b));
}
