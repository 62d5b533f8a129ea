import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  createRandomStream,
  fitEarth,
  type LayeredEarth,
  type Reading,
} from '../../../inversion';
import { createLayeredProblem } from '../../../inversion/fit/layered-problem';
import { MODERATION, moderateModel } from '../../../inversion/fit/moderate-model';
import { createResidualSystem } from '../../../inversion/fit/residual-system';
import { layered } from '../support/fit-settings';

const SPREADS = Array.from({ length: 16 }, (_, i) => ({ type: 'wenner', spacing: 1.4 ** i }) as const);

function problemOf(earth: LayeredEarth, noise: number) {
  const random = createRandomStream(9);
  const readings = Array.from(createForwardOperator(SPREADS).predict(earth), (value, i): Reading => ({
    spread: SPREADS[i]!,
    apparentResistivity: value * Math.exp(noise * random.normal()),
    relativeError: noise,
  }));
  const layers = earth.resistivity.length;
  const system = createResidualSystem(createForwardOperator(SPREADS), readings);
  return { readings, problem: createLayeredProblem(system, layers, layered(layers)) };
}
const logs = (...values: number[]) => Float64Array.from(values, Math.log);

describe('moderateModel', () => {
  it('comes back along a valley of equivalence, and keeps to its share of χ²', () => {
    const { problem } = problemOf({ resistivity: [80, 6, 400], thickness: [3, 1.5] }, 0.03);
    // S = 0.25 S from a bed a thirtieth as thick: an end of the valley
    const thin = logs(80, 0.2, 400, 3, 0.05);
    const chi2 = problem.problem.evaluate(thin, new Float64Array(problem.problem.residuals));
    const found = moderateModel(problem, problem, { parameters: thin, chi2 }, logs(80, 80, 80, 2, 6));
    expect(found.chi2).toBeLessThanOrEqual((1 + MODERATION) * chi2);
    expect(found.parameters[4]!).toBeGreaterThan(Math.log(0.3));
    expect(found.parameters[1]!).toBeGreaterThan(Math.log(1));
  });

  it('leaves a ground alone that the readings tell', () => {
    const { readings, problem } = problemOf({ resistivity: [80, 20], thickness: [3] }, 0.03);
    const { earth, chi2PerReading } = fitEarth(readings, layered(2));
    const least = {
      parameters: logs(...earth.resistivity, ...earth.thickness),
      chi2: chi2PerReading * readings.length,
    };
    expect(moderateModel(problem, problem, least, logs(50, 50, 5))).toBe(least);
  });
});
