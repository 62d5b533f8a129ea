import { describe, expect, it } from 'vitest';
import { besselJ0 } from '../../../inversion/reference/bessel-j0';
import {
  integratedApparentResistivity,
  integratedPotential,
} from '../../../inversion/reference/direct-integration';
import { imageStrengths, potentialFromImages } from '../../../inversion/reference/image-strengths';
import { twoLayerPotential } from '../../../inversion/reference/two-layer-images';
import { createForwardOperator } from '../../../inversion';
import { relativeError } from '../support/relative-error';

describe('besselJ0', () => {
  // Abramowitz & Stegun 1964, table 9.1
  it.each([
    [0, 1],
    [1, 0.7651976865579666],
    [2, 0.22389077914123567],
    [5, -0.1775967713143383],
    [10, -0.2459357644513483],
    [50, 0.05581232766925181],
    [100, 0.019985850304223122],
  ])('J₀(%d)', (x, expected) => {
    expect(Math.abs(besselJ0(x) - expected)).toBeLessThan(1e-15);
  });

  it('joins where the series changes', () => {
    // J₀(40 ± δ) from its value and slope there
    const slope = (besselJ0(40.001) - besselJ0(39.999)) / 0.002;
    expect(slope).toBeCloseTo(-0.1260383, 5);
  });
});

describe('three slow paths', () => {
  it('agree on two layers: images, image strengths, integration', () => {
    for (const rho2 of [1, 10, 1000, 10_000]) {
      const earth = { resistivity: [100, rho2], thickness: [5] };
      const strengths = imageStrengths(earth.resistivity, [1], 20_000);
      for (const r of [1, 20, 300]) {
        const images = twoLayerPotential(r, 100, rho2, 5);
        const scale = 100 / r;
        expect(Math.abs(integratedPotential(r, earth) - images)).toBeLessThan(
          1e-12 * Math.max(scale, images),
        );
        expect(Math.abs(potentialFromImages(r, strengths, 5) - images)).toBeLessThan(
          1e-12 * Math.max(scale, images),
        );
      }
    }
  });

  it('agree on five layers of whole multiples of 0.5 m, and so does the fast operator', () => {
    const earth = { resistivity: [120, 60, 200, 80, 150], thickness: [1.5, 4, 2.5, 10] };
    const strengths = imageStrengths(earth.resistivity, [3, 8, 5, 20], 4000);
    for (const spacing of [1, 10, 80]) {
      const at = (r: number) => potentialFromImages(r, strengths, 0.5);
      const images = spacing * 2 * (at(spacing) - at(2 * spacing));
      const spread = { type: 'wenner', spacing } as const;
      expect(relativeError(integratedApparentResistivity(spread, earth), images)).toBeLessThan(1e-11);
      expect(relativeError(createForwardOperator([spread]).predict(earth)[0]!, images)).toBeLessThan(1e-10);
    }
  });
});
