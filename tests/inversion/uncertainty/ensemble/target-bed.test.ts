import { expect, it } from 'vitest';
import { holdsBed } from '../../../../inversion/uncertainty/ensemble/target-bed';

/** ρ₁…ρ_N, h₁…h_{N−1} */
function holds(parameters: number[], target: Partial<Parameters<typeof holdsBed>[1]> = {}): boolean {
  const earths = {
    size: 1,
    stride: parameters.length,
    layers: Int32Array.of((parameters.length + 1) / 2),
    parameters: Float64Array.from(parameters),
  };
  return holdsBed(earths, { resistivity: [50, 200], minThickness: 10, topAbove: 20, ...target })[0] === 1;
}

it('takes a bed in range that is thick and shallow enough, and none else', () => {
  expect(holds([10, 100, 10, 5, 10])).toBe(true);
  expect(holds([10, 100, 10, 5, 9.9])).toBe(false);
  expect(holds([10, 100, 10, 20.1, 10])).toBe(false);
  expect(holds([10, 201, 10, 5, 10])).toBe(false);
  expect(holds([10, 100, 10, 20, 10])).toBe(true);
});

it('takes adjoining layers in range as one bed, whose top is that of the first', () => {
  expect(holds([10, 60, 150, 10, 5, 6, 6])).toBe(true);
  expect(holds([10, 60, 300, 150, 10, 5, 6, 1, 6])).toBe(false);
  expect(holds([10, 60, 150, 10, 21, 6, 6])).toBe(false);
});

it('takes the half-space as endless', () => {
  expect(holds([100], { minThickness: 1e6 })).toBe(true);
  expect(holds([10, 100, 15], { minThickness: 1e6 })).toBe(true);
  expect(holds([10, 100, 25], { minThickness: 1e6 })).toBe(false);
});
