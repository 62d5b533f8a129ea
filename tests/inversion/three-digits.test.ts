import { expect, it } from 'vitest';
import { amount, threeDigits, timesOrDivided } from '../../inversion/three-digits';

const THIN = '\u202f';

it.each([
  [0.1, '0.100'],
  [46.43, '46.4'],
  [999.6, '1000'],
  [9996, `10${THIN}000`],
  [99_800, `99${THIN}800`],
  [-12.36, '\u221212.4'],
  [1.5e-12, '1.50e\u221212'],
  [1e20, '1.00e+20'],
  [0, '0'],
  [Number.NaN, '\u2013'],
])('%d is written %s', (value, text) => expect(threeDigits(value)).toBe(text));

it('keeps a unit with its number, and a factor with its sign', () => {
  expect(amount(12_345, 'Ω·m')).toBe(`12${THIN}300\u00a0Ω·m`);
  expect(timesOrDivided(1.1437)).toBe('×÷\u00a01.14');
});
