import { choleskyInPlace, choleskySolve } from '../matrix/cholesky';

/** ln 10: a nuisance value is free within about a factor of ten, which also keeps the problem well-posed. */
const FREEDOM = Math.LN10;

/** What is left of differences between readings when ln values of the ground may move to make up for them. */
export interface Nuisance {
  /** min over a of ‖d − J a‖² + ‖a/ln 10‖² for a whitened difference d, one entry a row of J */
  readonly remains: (difference: ArrayLike<number>) => number;
  /** j C jᵀ of one further whitened row, C = (JᵀJ + 1/ln² 10)⁻¹: what the nuisance adds to its variance of 1 */
  readonly variance: (row: ArrayLike<number>) => number;
}

/** From the row-major whitened Jacobian of the nuisance values, rows × columns. */
export function createNuisance(jacobian: Float64Array, rows: number, columns: number): Nuisance {
  const factor = new Float64Array(columns * columns);
  for (let a = 0; a < columns; a++) {
    for (let b = 0; b <= a; b++)
      for (let i = 0; i < rows; i++)
        factor[a * columns + b]! += jacobian[i * columns + a]! * jacobian[i * columns + b]!;
    factor[a * columns + a]! += 1 / (FREEDOM * FREEDOM);
  }
  choleskyInPlace(factor, columns);
  const solved = (right: Float64Array): number => {
    const x = Float64Array.from(right);
    choleskySolve(factor, columns, x);
    return right.reduce((sum, value, j) => sum + value * x[j]!, 0);
  };
  return {
    remains: (difference) => {
      const gradient = new Float64Array(columns);
      let sum = 0;
      for (let i = 0; i < rows; i++) {
        sum += difference[i]! * difference[i]!;
        for (let j = 0; j < columns; j++) gradient[j]! += jacobian[i * columns + j]! * difference[i]!;
      }
      return Math.max(0, sum - solved(gradient));
    },
    variance: (row) => solved(Float64Array.from(row)),
  };
}
