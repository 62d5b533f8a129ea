import { describe, expect, it } from 'vitest';
import {
  aicc,
  bic,
  chooseLayerCount,
  countDoubt,
  misfitProbability,
  withinNoise,
} from '../../../inversion/fit/layer-count';

describe('measures of a layer count', () => {
  it('BIC is χ² + p ln N', () => {
    expect(bic(12, 3, 20)).toBeCloseTo(12 + 3 * Math.log(20), 12);
  });

  it('AICc is χ² + 2p + 2p(p + 1)/(N − p − 1), and null without a spare reading', () => {
    expect(aicc(12, 3, 20)).toBeCloseTo(12 + 6 + 24 / 16, 12);
    expect(aicc(12, 3, 5)).toBeCloseTo(12 + 6 + 24, 12);
    expect(aicc(12, 3, 4)).toBeNull();
  });

  it('χ² is tested against its 95 % point for N − p, from two degrees of freedom on', () => {
    // 95 % point at 10 degrees of freedom: 18.307
    expect(withinNoise(18.3, 3, 13)).toBe(true);
    expect(withinNoise(18.32, 3, 13)).toBe(false);
    expect(withinNoise(0, 3, 4)).toBeNull();
    expect(misfitProbability(4, 3, 5)).toBeCloseTo(Math.exp(-2), 12);
  });
});

describe('chooseLayerCount', () => {
  it('takes the fewest within the noise, whatever the BIC says', () => {
    expect(
      chooseLayerCount([
        { bic: 90, withinNoise: false },
        { bic: 30, withinNoise: true },
        { bic: 20, withinNoise: true },
      ]),
    ).toBe(1);
  });

  it('takes the least BIC when none is within the noise', () => {
    expect(
      chooseLayerCount([
        { bic: 90, withinNoise: false },
        { bic: 40, withinNoise: false },
        { bic: 41, withinNoise: null },
      ]),
    ).toBe(1);
  });
});

describe('countDoubt', () => {
  const rows = [
    { layers: 1, bic: 20, withinNoise: false },
    { layers: 2, bic: 25, withinNoise: true },
  ].map((row) => ({
    ...row,
    status: 'converged-gradient' as const,
    chi2PerReading: 1,
    aicc: null,
    chosen: false,
    earth: { resistivity: [1], thickness: [] },
  }));

  it('speaks where the least BIC asks for another count than the noise does', () => {
    expect(countDoubt(rows, 1)).toEqual([
      'The count rests on the stated errors: 2 beds are the fewest within them, while the least BIC is that of 1 bed.',
    ]);
  });

  it('is silent where both agree', () => {
    expect(countDoubt([{ ...rows[0]!, bic: 30 }, rows[1]!], 1)).toEqual([]);
  });
});
