import { exp } from '../../math/exponential';
import { TOLERANCES } from '../../tolerances';
import type { FitBounds, Interval, LayeredEarth } from '../../types';
import { logCovariance, type LogCovariance } from '../../uncertainty/covariance';
import { Z95, type ParameterDoubt } from '../../uncertainty/parameter-doubt';
import type { LeastSquaresProblem } from '../levenberg-marquardt';

/**
 * C = (JᵀJ + λR)⁻¹ of lnρ of the cells, then of the ln shifts: the doubt that is left when the roughness counts as known
 * beforehand, each difference between neighbours a Gaussian of variance 1/(λw). It says nothing of grounds rougher than that.
 */
export function cellCovariance(problem: LeastSquaresProblem, free: Float64Array): LogCovariance {
  const jacobian = new Float64Array(problem.residuals * free.length);
  problem.linearise(free, new Float64Array(problem.residuals), jacobian);
  return logCovariance(
    jacobian,
    problem.residuals,
    Array.from(free, () => false),
  );
}

function rangeOfCell(value: number, deviation: number, [low, high]: readonly [number, number]): Interval {
  const reach = exp(Z95 * deviation);
  return [value / reach <= low ? null : value / reach, value * reach >= high ? null : value * reach];
}

/** The doubt of each cell in the shape of a layered fit: thicknesses and depths are those of the grid, so they are sure. */
export function doubtOfCells(
  earth: LayeredEarth,
  { deviation, covariance }: LogCovariance,
  bounds: FitBounds,
): ParameterDoubt {
  const cells = earth.resistivity.length;
  const width = deviation.length;
  const factors = earth.resistivity.map((_, i) => {
    const factor = exp(deviation[i]!);
    return factor > TOLERANCES.factorLimit ? null : factor;
  });
  let depth = 0;
  const depths = earth.thickness.map((h) => (depth += h));
  const sure = earth.thickness.map(() => 1);
  return {
    intervals: {
      resistivity: earth.resistivity.map((value, i) => rangeOfCell(value, deviation[i]!, bounds.resistivity)),
      thickness: earth.thickness.map((h): Interval => [h, h]),
      depth: depths.map((d): Interval => [d, d]),
    },
    factors: { resistivity: factors, thickness: sure, depth: sure },
    conductanceFactor: factors.slice(0, -1),
    resistanceFactor: factors.slice(0, -1),
    correlation: Array.from({ length: 2 * cells - 1 }, (_, a) =>
      Array.from({ length: 2 * cells - 1 }, (_unused, b) => {
        if (a >= cells || b >= cells) return null;
        if (a === b) return 1;
        const value = covariance[a * width + b]! / (deviation[a]! * deviation[b]!);
        return Math.min(1, Math.max(-1, value));
      }),
    ),
  };
}
