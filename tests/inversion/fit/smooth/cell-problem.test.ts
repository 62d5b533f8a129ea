import { describe, expect, it } from 'vitest';
import { createForwardOperator } from '../../../../inversion';
import { createCellProblem } from '../../../../inversion/fit/smooth/cell-problem';
import { cellGrid } from '../../../../inversion/fit/smooth/cell-grid';
import { cellCovariance } from '../../../../inversion/fit/smooth/smooth-doubt';
import { createResidualSystem } from '../../../../inversion/fit/residual-system';
import { SCHLUMBERGER, soundingOf } from '../../support/cell-grounds';
import { layered } from '../../support/fit-settings';

const READINGS = soundingOf({ resistivity: [100, 10, 500], thickness: [3, 15] }, SCHLUMBERGER, 0.03).map(
  (reading, i) => ({ ...reading, branch: i < 9 ? 'near' : 'far' }),
);
const SYSTEM = createResidualSystem(createForwardOperator(SCHLUMBERGER), READINGS, { branchShiftSigma: 0.1 });
const CELL = createCellProblem(SYSTEM, cellGrid(READINGS, 8), layered(1).bounds, 0.1);
const FREE = Float64Array.from([4.6, 4, 3, 2.5, 2.2, 3, 5, 6, 0.05]);
const PROBLEM = CELL.problem({
  lambda: 7,
  boundaryWeights: [1, 0.5, 2, 1, 1, 0.1, 1],
  reference: { logResistivity: 4, share: 0.01 },
});

const residualsAt = (free: Float64Array) => {
  const residual = new Float64Array(PROBLEM.residuals);
  return { sum: PROBLEM.evaluate(free, residual), residual };
};

describe('createCellProblem', () => {
  it('adds the weighted roughness and the pull of the reference to χ² and the shift', () => {
    const { sum } = residualsAt(FREE);
    const differences = [0.6, 1, 0.5, 0.3, 0.8, 2, 1];
    const weights = [1, 0.5, 2, 1, 1, 0.1, 1];
    const rough = differences.reduce((total, d, k) => total + weights[k]! * d * d, 0);
    const pull = FREE.slice(0, 8).reduce((total, value) => total + 0.01 * (value - 4) ** 2, 0);
    const { chi2 } = CELL.describe(FREE);
    expect(sum).toBeCloseTo(chi2 + 0.5 ** 2 + 7 * (rough + pull), 8);
  });

  it('has the slopes of its residuals', () => {
    const width = FREE.length;
    const jacobian = new Float64Array(PROBLEM.residuals * width);
    const residual = new Float64Array(PROBLEM.residuals);
    expect(PROBLEM.linearise(FREE, residual, jacobian)).toBeCloseTo(residualsAt(FREE).sum, 9);
    expect(residual).toEqual(residualsAt(FREE).residual);
    for (let j = 0; j < width; j++) {
      const moved = (by: number) => residualsAt(FREE.map((value, k) => (k === j ? value + by : value)));
      const [up, down] = [moved(1e-4).residual, moved(-1e-4).residual];
      up.forEach((value, i) => expect(jacobian[i * width + j]).toBeCloseTo((value - down[i]!) / 2e-4, 4));
    }
  });

  it('says of each cell what is left to doubt when the roughness is known', () => {
    const width = FREE.length;
    const { covariance, deviation } = cellCovariance(PROBLEM, FREE);
    const jacobian = new Float64Array(PROBLEM.residuals * width);
    PROBLEM.linearise(FREE, new Float64Array(PROBLEM.residuals), jacobian);
    // C (JᵀJ) = 1, the penalty rows among J
    for (let a = 0; a < width; a++)
      for (let b = 0; b < width; b++) {
        let product = 0;
        for (let k = 0; k < width; k++)
          for (let i = 0; i < PROBLEM.residuals; i++)
            product += covariance[a * width + k]! * jacobian[i * width + k]! * jacobian[i * width + b]!;
        expect(product).toBeCloseTo(a === b ? 1 : 0, 8);
      }
    expect(deviation[3]).toBeCloseTo(Math.sqrt(covariance[3 * width + 3]!), 12);
  });
});

describe('cellGrid', () => {
  it('runs from 0.05 of the shortest to once the longest spacing, even in ln depth', () => {
    const thickness = cellGrid(READINGS, 30);
    expect(thickness).toHaveLength(29);
    expect(thickness[0]).toBeCloseTo(0.05, 12);
    expect(thickness.reduce((sum, h) => sum + h, 0)).toBeCloseTo(1.3 ** 23, 8);
    expect(thickness[9]! / thickness[8]!).toBeCloseTo(thickness[20]! / thickness[19]!, 10);
  });

  it('spans a tenfold range also under one spacing', () => {
    const thickness = cellGrid(READINGS.slice(0, 1), 8);
    expect(thickness.reduce((sum, h) => sum + h, 0)).toBeCloseTo(1, 12);
  });
});
