import { expect, it } from 'vitest';
import { createRandomStream } from '../../../inversion';
import { normalEquations } from '../../../inversion/matrix/normal-equations';

it.each([1, 2, 3, 4, 5, 6, 7, 8, 9])('sums over the rows in their order, %i columns', (n) => {
  const random = createRandomStream(n);
  const rows = 11;
  const jacobian = Float64Array.from({ length: rows * n }, () => random.normal());
  const residual = Float64Array.from({ length: rows }, () => random.normal());
  const normal = new Float64Array(n * n);
  const slope = new Float64Array(n);
  normalEquations(jacobian, residual, normal, slope);
  const summed = (term: (i: number) => number) => {
    let sum = 0;
    for (let i = 0; i < rows; i++) sum += term(i);
    return sum;
  };
  for (let j = 0; j < n; j++) {
    expect(slope[j]).toBe(summed((i) => jacobian[i * n + j]! * residual[i]!));
    for (let k = 0; k <= j; k++)
      expect(normal[j * n + k]).toBe(summed((i) => jacobian[i * n + j]! * jacobian[i * n + k]!));
  }
});
