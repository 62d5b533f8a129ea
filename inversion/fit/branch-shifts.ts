import { exp } from '../math/exponential';
import { Z95 } from '../uncertainty/parameter-doubt';
import type { BranchShift, Reading } from '../types';

/** Which readings stand shifted together, and by which parameter. */
export interface BranchLayout {
  /** in order of first appearance; the empty list when nothing can be shifted */
  readonly branches: readonly { readonly name: string; readonly readings: number; readonly held: boolean }[];
  /** for each reading the place of its shift among the shifts, −1 = held at 0 */
  readonly shiftOf: Int32Array;
  /** number of shift parameters: branches that are not held */
  readonly shifts: number;
}

/** The name under which readings without a branch stand together. */
const UNNAMED = '';

/**
 * The branches of a sounding. The one with most readings (the first of them where several are alike) is held: a shift of
 * every branch alike is a shift of all resistivities, which no reading can tell. Fewer than two branches have no shifts.
 */
export function branchLayout(readings: readonly Reading[], wanted: boolean): BranchLayout {
  const counts = new Map<string, number>();
  for (const { branch = UNNAMED } of readings) counts.set(branch, (counts.get(branch) ?? 0) + 1);
  if (!wanted || counts.size < 2)
    return { branches: [], shiftOf: new Int32Array(readings.length).fill(-1), shifts: 0 };
  const most = Math.max(...counts.values());
  const reference = [...counts.keys()].find((name) => counts.get(name) === most)!;
  const shifted = [...counts.keys()].filter((name) => name !== reference);
  return {
    branches: [...counts].map(([name, count]) => ({ name, readings: count, held: name === reference })),
    shiftOf: Int32Array.from(readings, ({ branch = UNNAMED }) => shifted.indexOf(branch)),
    shifts: shifted.length,
  };
}

/**
 * The branches with their factors exp(shift). `parameters` and the standard deviations `deviation` end with the shifts
 * of those branches that are not held, in order; the interval is linear in the shift.
 */
export function describeShifts(
  branches: BranchLayout['branches'],
  parameters: Float64Array,
  deviation: Float64Array,
): BranchShift[] {
  let next = parameters.length - branches.filter(({ held }) => !held).length;
  return branches.map(({ name, readings, held }) => {
    if (held) return { branch: name, readings, factor: 1, interval: [1, 1], held };
    const shift = parameters[next]!;
    const reach = Z95 * deviation[next]!;
    next += 1;
    return {
      branch: name,
      readings,
      factor: exp(shift),
      interval: [exp(shift - reach), exp(shift + reach)],
      held,
    };
  });
}
