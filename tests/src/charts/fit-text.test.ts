import { expect, it } from 'vitest';
import { fitText, wrapText } from '../../../src/charts/fit-text';

it('runs a long note over lines, whole words each', () => {
  expect(wrapText('weathered schist, ρ held', 90)).toEqual(['weathered', 'schist, ρ held']);
  expect(wrapText('weathered', 10)).toEqual(['weathered']);
});

it('cuts a name with an ellipsis where it does not fit', () => {
  expect(fitText('4 beds, count found', 60)).toBe('4 beds, c…');
  expect(fitText('4 beds', 60)).toBe('4 beds');
});
