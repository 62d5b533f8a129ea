import { expect, it } from 'vitest';
import { errorWords } from '../../../../src/features/readings/error-words';

const readings = (...errors: (number | null)[]) => errors.map((standardError) => ({ standardError }));

it('names the floor that a fit counts with, and for how many readings it stands alone', () => {
  const words = (...errors: (number | null)[]) =>
    errorWords(readings(...errors), 0.03).replace('\u00a0', ' ');
  expect(words()).toBe('Total error: the survey’s floor of 3.0 %, as no reading states an error of its own.');
  expect(words(null, 0)).toBe(words());
  expect(words(0.01, 0.02)).toBe(
    'Total error: each reading’s own error and the survey’s floor of 3.0 %, added in quadrature.',
  );
  expect(words(0.01, 0.02, null)).toBe(
    'Total error: own error and the survey’s floor of 3.0 %, added in quadrature, for 2 readings; the floor alone for the 1 that states no error.',
  );
});
