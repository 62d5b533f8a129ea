import { describe, expect, test } from 'vitest';
import { cos, sin } from '../../../inversion/math/circular';
import { exp, expm1 } from '../../../inversion/math/exponential';
import { hypot, norm } from '../../../inversion/math/hypot';
import { log, log1p, log2 } from '../../../inversion/math/logarithm';
import { pow, pow10, pow2 } from '../../../inversion/math/power';
import { elementaryValues } from '../support/read-reference';

const table = elementaryValues();

function ulpOf(value: number): number {
  const size = Math.abs(value);
  const bits = new BigUint64Array(new Float64Array([size]).buffer);
  const next = new Float64Array(new BigUint64Array([bits[0]! + 1n]).buffer)[0]!;
  return next === Infinity ? size * 2 ** -53 : next - size;
}

function worstUlp(name: string, f: (x: number) => number): number {
  return Math.max(...table[name]!.map(([x, high, rest]) => Math.abs(f(x) - high - rest) / ulpOf(high)));
}

describe('elementary functions against 80-digit values, in units of the last place', () => {
  test.each([
    ['exp', exp, 1],
    ['expm1', expm1, 1],
    ['log', log, 1],
    ['log1p', log1p, 1],
    ['log2', log2, 2],
    ['sin', sin, 1],
    ['cos', cos, 1],
    ['pow2', pow2, 1],
    ['pow10', pow10, 3],
  ] as const)('%s', (name, f, most) => {
    expect(table[name]!.length).toBeGreaterThanOrEqual(150);
    expect(worstUlp(name, f)).toBeLessThanOrEqual(most);
  });
});

describe('their ends', () => {
  test('overflow, underflow and what has no value', () => {
    expect([exp(709.8), exp(-746), exp(-Infinity), exp(Infinity), exp(NaN)]).toEqual([
      Infinity,
      0,
      0,
      Infinity,
      NaN,
    ]);
    expect(exp(709.7)).toBeLessThan(Number.MAX_VALUE);
    expect([expm1(710), expm1(-50), expm1(NaN), expm1(0)]).toEqual([Infinity, -1, NaN, 0]);
    expect([log(0), log(-1), log(Infinity), log(1), log(NaN)]).toEqual([-Infinity, NaN, Infinity, 0, NaN]);
    expect([log1p(-1), log1p(-2), log1p(Infinity), log1p(0)]).toEqual([-Infinity, NaN, Infinity, 0]);
    expect([sin(2e6), cos(NaN), sin(0), cos(0)]).toEqual([NaN, NaN, 0, 1]);
  });

  test('whole powers are exact', () => {
    for (const k of [-1022, -60, -1, 0, 1, 52, 1023]) expect(pow2(k)).toBe(2 ** k);
    expect([pow10(-3), pow10(0), pow10(5), pow10(22)]).toEqual([1e-3, 1, 1e5, 1e22]);
    expect([log2(8), log2(2 ** -40)]).toEqual([3, -40]);
  });
});

test('a power of any base', () => {
  // 0.2^1.5 and 3^-2.5 as doubles, from Python's decimal module
  expect(Math.abs(pow(0.2, 1.5) / 0.08944271909999159 - 1)).toBeLessThan(7e-16);
  expect(Math.abs(pow(3, -2.5) / 0.06415002990995841 - 1)).toBeLessThan(8e-16);
});

describe('lengths', () => {
  test('of two and of many values', () => {
    expect(hypot(3, 4)).toBe(5);
    expect(norm([1, 2, -2, 4, 0])).toBe(5);
    expect(norm([])).toBe(0);
    expect(norm([3e200, -4e200]) / 5e200).toBeCloseTo(1, 15);
    expect(norm([3e-200, 4e-200]) / 5e-200).toBeCloseTo(1, 15);
  });
});
