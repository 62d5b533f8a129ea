import { expect, it } from 'vitest';
import { determinationOf } from '../../../inversion';

// limits of Auken & Christiansen 2004, from memory
it('grades a value by its 68 % factor', () => {
  expect([1.1, 1.2, 1.49, 1.5, 1.99, 2, null].map((factor) => determinationOf(factor, false))).toEqual([
    'well',
    'determined',
    'determined',
    'poorly',
    'poorly',
    'not determined',
    'not determined',
  ]);
  expect(determinationOf(1, true)).toBe('held');
});
