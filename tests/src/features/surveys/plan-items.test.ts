import { expect, it } from 'vitest';
import type { SoundingRow } from '../../../../server/contract/soundings';
import { planCounts, planItems } from '../../../../src/features/surveys/plan-items';

const sounding = (name: string, state: SoundingRow['state'], misfitProbability: number | null) =>
  ({ id: name, name, xM: 0, yM: 0, lineName: null, state, latestRun: { misfitProbability } }) as SoundingRow;

it('marks and counts apart the soundings whose fit the readings reject', () => {
  const { items } = planItems(
    's',
    [
      sounding('S-1', 'accepted', 0.3),
      sounding('S-2', 'fitted', 1e-5),
      sounding('S-3', 'fitted', 0.4),
      sounding('S-4', 'fitted', 0.2),
      sounding('S-5', 'draft', 1e-5),
    ],
    [],
  );
  expect(planCounts(items).map(({ state, look, count }) => [state, look.label, count])).toEqual([
    ['fitted', 'Fitted', 2],
    ['fitted', 'Fit does not explain the readings', 1],
    ['draft', 'In draft', 1],
    ['accepted', 'Accepted', 1],
  ]);
});
