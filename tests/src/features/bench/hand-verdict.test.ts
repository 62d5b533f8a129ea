import { expect, it } from 'vitest';
import type { FitResult } from '../../../../server/contract/fit-result';
import { boundsReached } from '../../../../src/features/bench/bounds-reached';
import { verdictOf } from '../../../../src/features/bench/hand-verdict';
import { DEFAULT_BOUNDS } from '../../../../server/contract/fit-settings';

const READINGS = 20;
const hand = { resistivity: [100, 10], thickness: [5] };
const byHand = (chi2: number) =>
  verdictOf({ hand, isFromLadder: false }, null, { chi2PerReading: chi2 / READINGS }, READINGS);

it.each([
  [20, 'explains the readings', false],
  // 37.57 is the 99 % point for 20 degrees of freedom in printed tables, 33.41 that for 17
  [37.4, 'explains the readings', false],
  [37.8, 'does not explain the readings', true],
  [3, 'comes closer to the readings than their errors ask for', false],
])('judges χ² %d of a model by hand with N degrees of freedom', (chi2, words, rejects) => {
  expect(byHand(chi2)).toMatchObject({ words, rejects });
  expect(byHand(chi2)?.title).toContain('N = 20 ');
});

it.each([
  [20, true, 'explains the readings'],
  [30, false, 'lies outside the noise of the readings'],
  [37.4, false, 'does not explain the readings'],
  [20, null, undefined],
])('judges χ² %d of a model of the ladder as its row does', (chi2, withinNoise, words) => {
  const chi2PerReading = chi2 / READINGS;
  const count = { earth: hand, chi2PerReading, bic: chi2 + 3 * Math.log(READINGS), withinNoise };
  const run = { result: { layerCounts: [count] } as unknown as FitResult };
  const judged = verdictOf({ hand, isFromLadder: true }, run, { chi2PerReading }, READINGS);
  expect(judged?.words).toBe(words);
  expect(judged?.title.includes('N − p = 17 ')).toBe(words === undefined ? undefined : true);
});

it('judges neither the model of a run nor one that no ladder holds', () => {
  const misfit = { chi2PerReading: 1 };
  expect(verdictOf({ hand: null, isFromLadder: false }, null, misfit, READINGS)).toBeNull();
  expect(verdictOf({ hand, isFromLadder: true }, null, misfit, READINGS)).toBeNull();
});

it('names the values at a bound of the search, but none that was held there', () => {
  const earth = { resistivity: [100, 1e5, 10], thickness: [0.02, 4] };
  const words = (fixed: { on: 'thickness'; index: number; value: number }[]) =>
    boundsReached(earth, { bounds: DEFAULT_BOUNDS, fixed }).map((text) =>
      text.replace(/[\u00a0\u202f]/g, ' '),
    );
  const atResistivity = 'It has a bed of 100 000 Ω·m, at the bound of the search.';
  expect(words([])).toEqual(['It has a bed 0.0200 m thick, at the bound of the search.', atResistivity]);
  expect(words([{ on: 'thickness', index: 0, value: 0.02 }])).toEqual([atResistivity]);
});
