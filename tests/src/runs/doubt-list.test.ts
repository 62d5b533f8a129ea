import { expect, it } from 'vitest';
import type { FitResult } from '../../../server/contract/fit-result';
import { fitSettingsSchema } from '../../../server/contract/fit-settings';
import { fitEarth } from '../../../inversion';
import { doubtsOf, isLimitedByReadings } from '../../../src/runs/doubt-list';

const readings = [1, 2, 4, 8, 16, 32, 64].map((spacing) => ({
  spread: { type: 'wenner', spacing } as const,
  apparentResistivity: 40 + 60 / (1 + spacing / 6),
  relativeError: 0.02,
}));
const settings = fitSettingsSchema.parse({ kind: 'layered', layers: 2 });
const closed = {
  ...fitEarth(readings, settings),
  intervals: {
    resistivity: [
      [90, 110],
      [30, 50],
    ],
    thickness: [[3, 5]],
    depth: [[3, 5]],
  },
} satisfies FitResult;

it('says that the readings limit every value only where nothing else does', () => {
  const held = { on: 'thickness', index: 0, value: 4 } as const;
  const prior = { on: 'depth', index: 0, value: 4, sigma: 0.3 } as const;
  expect(isLimitedByReadings(closed, settings)).toBe(true);
  expect(isLimitedByReadings(closed, { ...settings, fixed: [held] })).toBe(false);
  expect(isLimitedByReadings(closed, { ...settings, priors: [prior] })).toBe(false);
  const open = { ...closed, intervals: { ...closed.intervals, depth: [[3, null]] } } satisfies FitResult;
  expect(isLimitedByReadings(open, settings)).toBe(false);
  expect(isLimitedByReadings({ ...closed, reachedTarget: true }, settings)).toBe(false);
});

it('names what was known beforehand as a thing the ranges rest on', () => {
  const prior = { on: 'depth', index: 0, value: 4, sigma: 0.3 } as const;
  const doubts = doubtsOf(closed, { excluded: [], settings: { ...settings, priors: [prior] } });
  expect(doubts.map((doubt) => doubt.replaceAll('\u00a0', ' '))).toContain(
    'The ranges rest on what was known beforehand as well: base of bed 1 at 4.00 ± 0.300 m.',
  );
});
