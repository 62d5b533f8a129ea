import { rowsOf, type CurveBranch, type CurvePoint } from './curve-branches';
import { nameOf, say, type ReadingCheck } from './reading-check';
import { READING_TOLERANCES } from './reading-tolerances';
import { exp } from '../math/exponential';
import { norm } from '../math/hypot';

interface Departure {
  readonly point: CurvePoint;
  /** ln ρa, measured minus what its neighbours make expect */
  readonly residual: number;
  readonly limit: number;
}

/** Weights of the polynomial through `xs`, evaluated at `x`: Σ wᵢ yᵢ is its value there. */
const lagrangeWeights = (xs: readonly number[], x: number): number[] =>
  xs.map((xi, i) => xs.reduce((weight, xj, j) => (i === j ? weight : (weight * (x - xj)) / (xi - xj)), 1));

/** Against the cubic through two neighbours on each side, or the quadratic where one side has but one. */
function departureOf(points: readonly CurvePoint[], i: number): Departure | null {
  const [before, point, after] = [points[i - 1], points[i], points[i + 1]];
  if (!before || !point || !after) return null;
  const beside = [points[i - 2], before, after, points[i + 2]].filter((p) => p !== undefined);
  if (beside.length < 3) return null;
  const weights = lagrangeWeights(
    beside.map(({ x }) => x),
    point.x,
  );
  const expected = beside.reduce((sum, { y }, k) => sum + (weights[k] ?? 0) * y, 0);
  const error = norm([point.error, ...beside.map((p, k) => (weights[k] ?? 0) * p.error)]);
  const { trendStandardErrors, cubicBend, quadraticBend } = READING_TOLERANCES;
  const bend = beside.length === 4 ? cubicBend : quadraticBend;
  return {
    point,
    residual: point.y - expected,
    limit: trendStandardErrors * error + bend * (point.x - before.x) * (after.x - point.x),
  };
}

const excess = ({ residual, limit }: Departure): number => Math.abs(residual) / limit;

/** The point that lies farthest beyond its limit, or null. */
function worstOf(points: readonly CurvePoint[]): Departure | null {
  let worst: Departure | null = null;
  for (let i = 1; i < points.length - 1; i++) {
    const departure = departureOf(points, i);
    if (departure && excess(departure) > (worst ? excess(worst) : 1)) worst = departure;
  }
  return worst;
}

/**
 * Points that stand apart from their neighbours in the branch. The worst is told and set aside before the next is
 * sought, so that one bad value does not accuse the good ones beside it. Ends of a branch cannot be judged.
 */
export function checkTrend(branches: readonly CurveBranch[]): ReadingCheck[] {
  return branches.flatMap(({ points }) => {
    const found: ReadingCheck[] = [];
    let left = points;
    for (;;) {
      const worst = worstOf(left);
      const first = worst?.point.readings[0];
      if (!worst || !first) break;
      left = left.filter((point) => point !== worst.point);
      found.push({
        rows: rowsOf(worst.point),
        kind: 'far-from-trend',
        message:
          `${nameOf(first)}: ρa ${say(exp(worst.point.y))} Ω·m, where the readings beside it suggest ` +
          `${say(exp(worst.point.y - worst.residual))} Ω·m (${say(100 * (exp(worst.residual) - 1), 2)} %). Measure again, or look at the sheet.`,
        rule: 'within four standard errors, and the bend of a layered earth, of the curve through its neighbours',
        source: 'bend allowed as measured on random layered earths',
      });
    }
    return found;
  });
}
