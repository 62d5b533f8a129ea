import { describe, expect, it } from 'vitest';
import {
  deriveWithRange,
  InversionError,
  mailletQuantity,
  rangeOf,
  type LayeredEarth,
} from '../../../inversion';

describe('rangeOf', () => {
  it('gives quantiles with straight lines between ordered values, whatever their order', () => {
    const values = Array.from({ length: 101 }, (_, i) => (i * 37) % 101);
    expect(rangeOf(values)).toEqual({ p5: 5, p16: 16, p50: 50, p84: 84, p95: 95, count: 101, without: 0 });
    expect(rangeOf([1, 3])!.p50).toBe(2);
    expect(rangeOf([1, 3])!.p95).toBeCloseTo(2.9, 12);
    expect(rangeOf([4])).toMatchObject({ p5: 4, p95: 4, count: 1 });
  });

  it('counts the members that do not have the quantity, and keeps them out of the quantiles', () => {
    expect(rangeOf([null, 2, null, 2])).toMatchObject({ p50: 2, count: 2, without: 2 });
    expect(rangeOf([null])).toBeNull();
    expect(rangeOf([])).toBeNull();
  });

  it('refuses a value that is no number', () => {
    expect(() => rangeOf([1, NaN])).toThrow('value 2 of the ensemble is NaN');
    expect(() => rangeOf([Infinity])).toThrow(InversionError);
  });
});

describe('deriveWithRange', () => {
  const best: LayeredEarth = { resistivity: [10, 50, 200], thickness: [5, 10] };
  const members = Array.from({ length: 21 }, (_, i) => ({ ...best, resistivity: [10 + i, 50, 200] }));

  it('pushes an ensemble of earths through a quantity and names its formula and source', () => {
    const cover = deriveWithRange(mailletQuantity('conductance', { aboveDepth: 5 }), best, members);
    expect(cover.value).toBeCloseTo(0.5, 12);
    expect(cover.range).toMatchObject({ count: 21 });
    expect(cover.range!.p50).toBeCloseTo(0.25, 12);
    expect(cover.range!.p95).toBeCloseTo(5 / 11, 12);
    expect(cover).toMatchObject({ unit: 'S', formula: 'S = Σ h/ρ' });
    expect(cover.source).toContain('Maillet 1947');
  });

  it('makes up no range without members', () => {
    expect(deriveWithRange(mailletQuantity('anisotropy'), best).range).toBeNull();
  });

  it('knows every quantity of Maillet', () => {
    const of = (name: Parameters<typeof mailletQuantity>[0]) =>
      deriveWithRange(mailletQuantity(name), best).value;
    expect(of('resistance')).toBe(550);
    expect(of('longitudinal')).toBeCloseTo(15 / 0.7, 12);
    expect(of('transverse')).toBeCloseTo(550 / 15, 12);
    expect(of('anisotropy')).toBeCloseTo(1.30809, 5);
  });
});
