import {
  contrastRatio,
  linearRgbToHex,
  oklabDistance,
  oklabFromPolar,
  oklabToLinearRgb,
  type Oklab,
} from './oklab';

/** The whole product colours resistivity over this range, Ω·m; values outside take the colour of the end. */
export const RAMP_RANGE_OHM_M = { low: 1, high: 10_000 } as const;

/** Deep blue, teal, green, ochre, cream: hue and lightness turn together, so the order holds for every kind of sight. */
const ANCHORS: readonly Oklab[] = [
  oklabFromPolar(0.26, 0.095, 268),
  oklabFromPolar(0.44, 0.072, 214),
  oklabFromPolar(0.615, 0.088, 156),
  oklabFromPolar(0.785, 0.115, 92),
  oklabFromPolar(0.945, 0.04, 80),
];

const FINE_STEPS = 1024;
const TABLE_STEPS = 400;

const TABLE: readonly string[] = evenTable();

/** Hex colour of a resistivity in Ω·m on the log ramp. */
export function rampColor(resistivity: number): string {
  const position = Math.min(1, Math.max(0, rampPosition(resistivity)));
  return TABLE[Math.round(position * TABLE_STEPS)] ?? '#000000';
}

/** 0 at 1 Ω·m, 1 at 10 000 Ω·m, even in the logarithm; unbounded outside. */
export function rampPosition(resistivity: number): number {
  const { low, high } = RAMP_RANGE_OHM_M;
  return Math.log(resistivity / low) / Math.log(high / low);
}

/** Black or white, whichever reads better on a colour; at least 4.5:1 on the whole ramp. */
export function textColorOn(background: string): string {
  return contrastRatio(background, '#000000') >= contrastRatio(background, '#ffffff') ? '#000000' : '#ffffff';
}

/** Stops for an SVG or CSS gradient, low resistivity first. */
export function rampStops(count = 33): { offset: number; color: string }[] {
  return Array.from({ length: count }, (_, index) => {
    const offset = index / (count - 1);
    return { offset, color: TABLE[Math.round(offset * TABLE_STEPS)] ?? '#000000' };
  });
}

/** Walks the curve through the anchors at a constant pace in OKLab. */
function evenTable(): string[] {
  const fine = Array.from({ length: FINE_STEPS + 1 }, (_, index) => pointOnCurve(index / FINE_STEPS));
  const travelled = [0];
  for (let i = 1; i < fine.length; i++)
    travelled.push((travelled[i - 1] ?? 0) + oklabDistance(at(fine, i - 1), at(fine, i)));
  const total = travelled[FINE_STEPS] ?? 1;
  let segment = 0;
  return Array.from({ length: TABLE_STEPS + 1 }, (_, index) => {
    const goal = (index / TABLE_STEPS) * total;
    while (segment < FINE_STEPS - 1 && (travelled[segment + 1] ?? total) < goal) segment++;
    const start = travelled[segment] ?? 0;
    const length = (travelled[segment + 1] ?? total) - start;
    return linearRgbToHex(
      oklabToLinearRgb(mix(at(fine, segment), at(fine, segment + 1), (goal - start) / length)),
    );
  });
}

/** Catmull–Rom curve through the anchors; `t` runs from 0 to 1. */
function pointOnCurve(t: number): Oklab {
  const scaled = t * (ANCHORS.length - 1);
  const index = Math.min(Math.floor(scaled), ANCHORS.length - 2);
  const u = scaled - index;
  const [p0, p1, p2, p3] = [
    at(ANCHORS, index - 1),
    at(ANCHORS, index),
    at(ANCHORS, index + 1),
    at(ANCHORS, index + 2),
  ];
  const blend = (key: keyof Oklab) =>
    0.5 *
    (2 * p1[key] +
      (p2[key] - p0[key]) * u +
      (2 * p0[key] - 5 * p1[key] + 4 * p2[key] - p3[key]) * u ** 2 +
      (3 * p1[key] - p0[key] - 3 * p2[key] + p3[key]) * u ** 3);
  return { l: blend('l'), a: blend('a'), b: blend('b') };
}

function mix(from: Oklab, to: Oklab, t: number): Oklab {
  return {
    l: from.l + (to.l - from.l) * t,
    a: from.a + (to.a - from.a) * t,
    b: from.b + (to.b - from.b) * t,
  };
}

/** Item at an index, the ends repeated beyond the list. */
function at(list: readonly Oklab[], index: number): Oklab {
  const item = list[Math.min(list.length - 1, Math.max(0, index))];
  if (!item) throw new RangeError('the ramp has no anchors');
  return item;
}
