import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import type { ReducedProblem } from './reduced-problem';

/** The packaged solver refuses a single point; a second one that is always met changes nothing. */
const FEWEST_POINTS = 2;

/**
 * δ = −(RᵀR + damping)⁻¹Rᵀz of a reduced problem, clipped to `low` … `high`, by the packaged solver: the step of the fit that is
 * shown. It is handed the reduced problem, whose points are the rows of R,
 * so it neither sees the readings nor runs a forward model.
 */
export function packagedStep(
  { size, triangle, rest }: ReducedProblem,
  low: readonly number[],
  high: readonly number[],
  damping: number,
): ArrayLike<number> {
  const points = Array.from({ length: Math.max(FEWEST_POINTS, size) }, (_, i) => i);
  const row = low.map(() => 0);
  const rowOf = (i: number): number[] => {
    for (let k = 0; k < size; k++) row[k] = i < size ? triangle[i * size + k]! : 0;
    return row;
  };
  const valueAt = (delta: readonly number[], i: number): number => {
    if (i >= size) return 0;
    let value = rest[i]!;
    for (let k = i; k < size; k++) value += triangle[i * size + k]! * delta[k]!;
    return value;
  };
  return levenbergMarquardt({ x: points, y: points.map(() => 0) }, (delta) => (i) => valueAt(delta, i), {
    initialValues: low.map(() => 0),
    minValues: [...low],
    maxValues: [...high],
    damping,
    maxIterations: 1,
    errorTolerance: 0,
    jacobianFunction: () => rowOf,
  }).parameterValues;
}
