import { rowsOf, type CurveBranch, type CurvePoint } from './curve-branches';
import { nameOf, say, type ReadingCheck } from './reading-check';
import { READING_TOLERANCES } from './reading-tolerances';
import { exp } from '../math/exponential';
import { hypot, norm } from '../math/hypot';

interface Join {
  readonly points: readonly CurvePoint[];
  /** ln ρa of the wider MN minus that of the narrower, at one spacing */
  readonly shift: number;
  /** standard error of `shift` */
  readonly error: number;
  /** ln ρa that the ground itself may make between the two */
  readonly bend: number;
  readonly where: string;
}

const placeOf = ({ readings, x }: CurvePoint): string =>
  readings[0] ? nameOf(readings[0]) : `${say(exp(x))} m`;

/** ln ρa of a branch at x by a straight line between its neighbours, with its error; null outside of the branch. */
function valueAt(branch: CurveBranch, x: number): { y: number; error: number; points: CurvePoint[] } | null {
  const near = branch.points.find((point) => Math.abs(point.x - x) < 1e-6);
  if (near) return { y: near.y, error: near.error, points: [near] };
  const after = branch.points.findIndex((point) => point.x > x);
  const [from, to] = [branch.points[after - 1], branch.points[after]];
  if (!from || !to) return null;
  const share = (x - from.x) / (to.x - from.x);
  return {
    y: from.y + share * (to.y - from.y),
    error: hypot((1 - share) * from.error, share * to.error),
    points: [from, to],
  };
}

/** Where two branches overlap: their mean shift over the spacings that both hold. */
function overlap(narrow: CurveBranch, wide: CurveBranch): Join | null {
  const pairs = wide.points.flatMap((point) => {
    const other = valueAt(narrow, point.x);
    return other ? [{ point, other }] : [];
  });
  if (pairs.length === 0) return null;
  const equal = pairs.filter(({ other }) => other.points.length === 1);
  const used = equal.length > 0 ? equal : pairs;
  const shift = used.reduce((sum, { point, other }) => sum + point.y - other.y, 0) / used.length;
  const error = norm(used.map(({ point, other }) => hypot(point.error, other.error))) / used.length;
  return {
    points: used.flatMap(({ point, other }) => [...other.points, point]),
    shift,
    error,
    bend: 0,
    where: used.map(({ point }) => placeOf(point)).join(', '),
  };
}

/** Where they do not overlap: the step over the gap against the mean slope of the two ends. */
function gap(narrow: CurveBranch, wide: CurveBranch): Join | null {
  const [before, last] = narrow.points.slice(-2);
  const [first, after] = wide.points;
  if (!before || !last || !first || !after || first.x <= last.x) return null;
  const run = first.x - last.x;
  const [fromRun, toRun] = [last.x - before.x, after.x - first.x];
  const slope = ((last.y - before.y) / fromRun + (after.y - first.y) / toRun) / 2;
  const [a, b] = [run / (2 * fromRun), run / (2 * toRun)];
  return {
    points: [last, first],
    shift: first.y - last.y - slope * run,
    error: norm([a * before.error, (1 + a) * last.error, (1 + b) * first.error, b * after.error]),
    bend: READING_TOLERANCES.gapBend * run * run,
    where: `between ${placeOf(last)} and ${placeOf(first)}`,
  };
}

function limitOf({ error, bend }: Join): number {
  const { standardErrors, gapJump } = READING_TOLERANCES;
  return bend > 0 ? Math.max(standardErrors * error, gapJump) + bend : standardErrors * error;
}

function checkJoin(narrow: CurveBranch, wide: CurveBranch): ReadingCheck[] {
  const join = overlap(narrow, wide) ?? gap(narrow, wide);
  if (!join || narrow.halfMN === null || wide.halfMN === null) return [];
  const limit = limitOf(join);
  if (Math.abs(join.shift) <= limit) return [];
  const percent = 100 * (exp(join.shift) - 1);
  return [
    {
      rows: [...new Set(rowsOf(...join.points))],
      kind: 'branch-jump',
      message:
        `The branch of MN/2 ${say(wide.halfMN, 6)} m lies ${say(Math.abs(percent), 2)} % ${percent > 0 ? 'above' : 'below'} ` +
        `that of MN/2 ${say(narrow.halfMN, 6)} m at ${join.where}; the errors${join.bend > 0 ? ' and the bend of the curve' : ''} explain up to ` +
        `${say(100 * (exp(limit) - 1), 2)} %. Ground that changes beside M and N does this; no reading is moved.`,
      rule: 'branches of different MN join within twice the errors of their readings',
      source: 'on flat beds the exact K leaves next to no step at a change of MN',
    },
  ];
}

/** Branches of different MN that do not join, each against the one before it. */
export function checkBranches(branches: readonly CurveBranch[]): ReadingCheck[] {
  return branches.flatMap((branch, i) => {
    const next = branches[i + 1];
    return next ? checkJoin(branch, next) : [];
  });
}
