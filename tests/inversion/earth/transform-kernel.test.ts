import { describe, expect, it } from 'vitest';
import { resistivityTransform } from '../../../inversion/earth/transform';
import {
  createKernelScratch,
  transformAndDerivatives,
  transformAtNodes,
} from '../../../inversion/earth/transform-kernel';
import { createRandomStream } from '../../../inversion';
import { randomEarth } from '../../../inversion/reference/random-cases';
import { relativeError } from '../support/relative-error';

const LAMBDA = Float64Array.from({ length: 200 }, (_, g) => 2 ** ((g - 130) / 5));

describe('transformAtNodes', () => {
  it('is the recurrence to rounding over twelve decades, for thin, thick and strongly contrasting layers', () => {
    const random = createRandomStream(3);
    const errors = Array.from({ length: 40 }, () => randomEarth(random)).flatMap((earth) => {
      const scratch = createKernelScratch(LAMBDA.length, 5);
      transformAtNodes([...earth.resistivity, ...earth.thickness], earth.resistivity.length, LAMBDA, scratch);
      return Array.from(LAMBDA, (lambda, g) =>
        relativeError(scratch.transform[g]!, resistivityTransform(earth, lambda)),
      );
    });
    expect(Math.max(...errors)).toBeLessThan(5e-13);
  });

  it('ends on the half-space at λ → 0 and on the first layer at λ → ∞', () => {
    const earth = { resistivity: [100, 1, 5000], thickness: [2, 3] };
    expect(resistivityTransform(earth, 1e-9)).toBeCloseTo(5000, 0);
    expect(resistivityTransform(earth, 1e6)).toBe(100);
  });
});

describe('transformAndDerivatives', () => {
  it('agrees with central differences over a ladder of steps to 1e-6', () => {
    const random = createRandomStream(11);
    for (let k = 0; k < 12; k++) {
      const earth = randomEarth(random);
      const layers = earth.resistivity.length;
      const parameters = [...earth.resistivity, ...earth.thickness];
      const scratch = createKernelScratch(LAMBDA.length, 5);
      transformAndDerivatives(parameters, layers, LAMBDA, scratch);
      parameters.forEach((_, j) => {
        const best = Math.min(
          ...[1e-2, 1e-3, 1e-4, 1e-5].map((step) => worstGap(parameters, layers, j, step, scratch)),
        );
        expect(best).toBeLessThan(1e-6);
      });
    }
  });

  it('sums to T₁ over the resistivities, because T₁ scales with all of them', () => {
    const parameters = [100, 10, 1000, 2, 3];
    const scratch = createKernelScratch(LAMBDA.length, 5);
    transformAndDerivatives(parameters, 3, LAMBDA, scratch);
    LAMBDA.forEach((_, g) => {
      const sum = [0, 1, 2].reduce((total, i) => total + scratch.columns[i * LAMBDA.length + g]!, 0);
      expect(relativeError(sum, scratch.transform[g]!)).toBeLessThan(1e-12);
    });
  });
});

/** Largest |central difference − derivative| over T₁ for a step in ln parameter j. */
function worstGap(
  parameters: readonly number[],
  layers: number,
  j: number,
  step: number,
  analytic: ReturnType<typeof createKernelScratch>,
): number {
  const at = (sign: number) => {
    const scratch = createKernelScratch(LAMBDA.length, 5);
    transformAtNodes(parameters.with(j, parameters[j]! * Math.exp(sign * step)), layers, LAMBDA, scratch);
    return scratch.transform;
  };
  const up = at(1);
  const down = at(-1);
  const gaps = Array.from(LAMBDA, (_, g) => {
    const difference = (up[g]! - down[g]!) / (2 * step);
    return Math.abs(difference - analytic.columns[j * LAMBDA.length + g]!) / analytic.transform[g]!;
  });
  return Math.max(...gaps);
}
