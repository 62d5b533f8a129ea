import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import type { FitResult } from '../../../../server/contract/fit-result';
import { BedBasis } from '../../../../src/features/interpretations/bed-basis';

const result = {
  earth: { resistivity: [100, 20], thickness: [5] },
  intervals: {
    resistivity: [
      [100, 100],
      [18, 22],
    ],
    thickness: [[4, 6]],
    depth: [[4, 6]],
  },
  factors: { resistivity: [null, 1.1], thickness: [1.3], depth: [1.3] },
  misfitProbability: 0.4,
} as unknown as FitResult;

const textOf = (layerIndex: number, shown = result): string =>
  renderToStaticMarkup(<BedBasis result={shown} layerIndex={layerIndex} />)
    .replace(/<\/p>|<span class="block[^>]*>/g, '|')
    .replace(/<[^>]+>/g, '')
    .replace(/\u00a0/g, ' ');

it('says of a held value that it is held, and of any other its 95 % range and how well it is known', () => {
  expect(textOf(0)).toBe(' Bed 1|100 Ω·m|held|0 to 5.00 m|base, 95 % 4.00–6.00|determined|');
  expect(textOf(1)).toBe(' Bed 2|20.0 Ω·m|95 % 18.0–22.0|well determined|below 5.00 m|');
});

it('does not say how well a value is known by a run that the readings reject', () => {
  expect(textOf(1, { ...result, misfitProbability: 1e-6 })).not.toContain('determined');
});
