import { expect, it } from 'vitest';
import { faultOf } from '../../../../src/features/bench/value-cell';

const allowed = 'write a number from 0.001 to 10\u202f000\u202f000\u00a0Ω·m.';

it.each([
  ['abc', `Found “abc”: ${allowed}`],
  ['-3', `Found “-3”: ${allowed}`],
  ['1e9', `Found “1e9”: ${allowed}`],
  [' ', `Nothing is written: ${allowed}`],
  ['12,5', null],
  ['0.001', null],
])('a value by hand, %s', (text, fault) => expect(faultOf(text, [1e-3, 1e7], 'Ω·m')).toBe(fault));
