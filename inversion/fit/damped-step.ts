import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import type { ReducedProblem } from './reduced-problem';

/** The packaged solver refuses a single point; a second one that is always met changes nothing. */
const FEWEST_POINTS = 2;

/**
 * One damped step δ = −(RᵀR + damping)⁻¹Rᵀz, clipped to `low` … `high`, by the packaged solver. It is handed the reduced
 * problem, whose points are the rows of R, so it neither sees the readings nor runs a forward model.
 */
export function dampedStep(
  { size, triangle, rest }: ReducedProblem,
  low: number[],
  high: number[],
  damping: number,
): readonly number[] {
  const points = Math.max(FEWEST_POINTS, size);
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
  return levenbergMarquardt(
    { x: Float64Array.from({ length: points }, (_, i) => i), y: new Float64Array(points) },
    (delta) => (i) => valueAt(delta, i),
    {
      initialValues: low.map(() => 0),
      minValues: low,
      maxValues: high,
      damping,
      maxIterations: 1,
      errorTolerance: 0,
      jacobianFunction: () => rowOf,
    },
  ).parameterValues;
}
