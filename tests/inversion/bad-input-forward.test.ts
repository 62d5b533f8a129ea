import fc from 'fast-check';
import { expect, it } from 'vitest';
import { createForwardOperator, geometricFactor, type Spread } from '../../inversion';
import {
  answerOrRefusal,
  soundSpread,
  spoiltEarth,
  spoiltSpread,
  tally,
  wildEarth,
} from './support/bad-input';

const forward = (
  earth: Parameters<ReturnType<typeof createForwardOperator>['predict']>[0],
  spreads: Spread[],
) => answerOrRefusal({ ...earth, spreads }, () => Array.from(createForwardOperator(spreads).predict(earth)));

it('refuses what cannot be, or gives finite resistivities', () => {
  const seen = tally();
  fc.assert(
    fc.property(spoiltEarth, fc.array(spoiltSpread, { maxLength: 4 }), (earth, spreads) => {
      seen.count(forward(earth, spreads));
      spreads.forEach((spread) =>
        answerOrRefusal({ spreads: spread, ...spread }, () => geometricFactor(spread)),
      );
    }),
    { seed: 1, numRuns: 300 },
  );
  expect(Math.min(seen.answered(), seen.refused())).toBeGreaterThan(10);
});

it('takes every earth to contrasts of 10¹³ and beds of 1 µm', () => {
  fc.assert(
    fc.property(wildEarth, fc.array(soundSpread, { minLength: 1, maxLength: 4 }), (earth, spreads) => {
      expect(forward(earth, spreads)).toHaveLength(spreads.length);
    }),
    { seed: 1, numRuns: 300 },
  );
});

it.each<[string, Spread, string]>([
  ['a spacing that vanishes', { type: 'wenner', spacing: 1e-300 }, 'spread-length'],
  [
    'electrodes a micrometre and 10 000 km away',
    { type: 'electrodes', am: 1e-6, an: 1e7, bm: null, bn: null },
    'spread-length',
  ],
  ['no electrode at all', { type: 'electrodes', am: null, an: null, bm: null, bn: null }, 'spread-cancels'],
])('refuses %s at once, whose weights would take for ever or be none', (_, spread, code) => {
  expect(() => createForwardOperator([spread])).toThrow(expect.objectContaining({ code }));
});

it('calls a bed of 1 µm what it is: no bed', () => {
  const spreads: Spread[] = [{ type: 'wenner', spacing: 10 }];
  const thin = createForwardOperator(spreads).predict({
    resistivity: [1000, 100, 20],
    thickness: [1e-6, 5],
  })[0]!;
  const without = createForwardOperator(spreads).predict({ resistivity: [100, 20], thickness: [5] })[0]!;
  expect(thin / without).toBeCloseTo(1, 6);
});
