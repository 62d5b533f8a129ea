import { expect, it } from 'vitest';
import { misfitWords } from '../../../src/runs/misfit-words';

it.each([
  [0.001, 'does not explain the readings'],
  [0.4, 'explains the readings'],
  [0.99, 'explains the readings'],
  [0.999, 'comes closer to the readings than their errors ask for'],
  [null, null],
])('a misfit of chance %d says %s', (misfitProbability, words) =>
  expect(misfitWords({ misfitProbability })).toBe(words),
);

it('says nothing of a model that was not fitted', () => expect(misfitWords(null)).toBeNull());
