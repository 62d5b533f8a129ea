import { expect, it } from 'vitest';
import { soundingSections } from '../../../src/app/section-links';
import { tickedRuns, useTickedRuns } from '../../../src/runs/ticked-runs';

const linkOf = (soundingId: string): string | undefined =>
  soundingSections(soundingId, tickedRuns(useTickedRuns.getState(), soundingId)).find(
    ({ label }) => label === 'Side by side',
  )?.to;

it('carries the ticks of the Ledger to Side by side, each sounding its own', () => {
  expect(linkOf('s')).toBe('/soundings/s/side-by-side');
  useTickedRuns.getState().tick('s', ['a', 'b', 'c']);
  expect(linkOf('s')).toBe('/soundings/s/side-by-side?runs=a%2Cb%2Cc');
  expect(linkOf('other')).toBe('/soundings/other/side-by-side');
});

it('leaves the choice to Side by side where one run alone is ticked', () => {
  useTickedRuns.getState().tick('s', ['a']);
  expect(linkOf('s')).toBe('/soundings/s/side-by-side');
});
