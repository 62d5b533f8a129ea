import { rowsOf, type CurveBranch, type CurvePoint } from './curve-branches';
import { nameOf, say, type ReadingCheck } from './reading-check';
import { READING_TOLERANCES } from './reading-tolerances';
import { exp } from '../math/exponential';
import { hypot } from '../math/hypot';

const LIMITED = new Set(['schlumberger', 'half-schlumberger', 'wenner', 'pole-pole']);

function checkPair(from: CurvePoint, to: CurvePoint): ReadingCheck[] {
  const [first, second] = [from.readings[0], to.readings[0]];
  if (!first || !second || !LIMITED.has(first.reading.spread.type)) return [];
  const run = to.x - from.x;
  const slope = (to.y - from.y) / run;
  const slopeError = hypot(from.error, to.error) / run;
  const { steepestRise, standardErrors } = READING_TOLERANCES;
  if (!(slope - standardErrors * slopeError > steepestRise)) return [];
  return [
    {
      rows: rowsOf(from, to),
      kind: 'steep-rise',
      message:
        `ρa rises from ${say(exp(from.y))} Ω·m at ${nameOf(first)} to ${say(exp(to.y))} Ω·m at ${nameOf(second)}: ` +
        `slope ${slope.toFixed(2)} on log–log axes, ±${slopeError.toFixed(2)} from the two errors. ` +
        'No ground of flat beds does this: look for a misread value, a bad electrode or a change sideways.',
      rule: 'slope at most +1 within one MN branch, beyond twice its standard error',
      source: 'largest slope of any layered earth for this spread; computed with image series',
    },
  ];
}

/** Rises steeper than any layered earth allows, between neighbours of one branch; dipole–dipole may pass +1 and is left out. */
export function checkSlope(branches: readonly CurveBranch[]): ReadingCheck[] {
  return branches.flatMap(({ points }) =>
    points.flatMap((point, i) => {
      const next = points[i + 1];
      return next ? checkPair(point, next) : [];
    }),
  );
}
