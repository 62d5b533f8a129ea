import { describe, expect, it } from 'vitest';
import {
  ARCHIE_SETS,
  archieBulk,
  archieCautions,
  archiePorosity,
  archieWater,
  bulkFormationFactor,
  deriveWithRange,
  formationFactor,
  InversionError,
  porosityOf,
} from '../../../inversion';

const PLAIN = { a: 1, m: 2 };

describe('Archie’s law', () => {
  it('follows F = a·φ^−m and its inverses', () => {
    expect(formationFactor(0.2, PLAIN)).toBeCloseTo(25, 12);
    expect(porosityOf(25, PLAIN)).toBeCloseTo(0.2, 12);
    // 0.62 × 0.25^−2.15 by hand calculator
    expect(formationFactor(0.25, ARCHIE_SETS.humble)).toBeCloseTo(12.213, 3);
    for (const set of Object.values(ARCHIE_SETS))
      for (const porosity of [0.05, 0.3, 0.45])
        expect(porosityOf(formationFactor(porosity, set), set)).toBeCloseTo(porosity, 12);
  });

  it('goes from bulk and water to porosity, from bulk and porosity to water, and back to bulk', () => {
    expect(bulkFormationFactor(20).of(100)).toBe(5);
    expect(archiePorosity(4, PLAIN).of(100)).toBeCloseTo(0.2, 12);
    expect(archieWater(0.2, PLAIN).of(100)).toBeCloseTo(4, 12);
    expect(archieBulk(0.2, PLAIN).of(4)).toBeCloseTo(100, 12);
  });

  it('carries the range of the bulk resistivity, and counts the members that no porosity explains', () => {
    const found = deriveWithRange(archiePorosity(20, PLAIN), 80, [20, 80, 320, 10]);
    expect(found.value).toBeCloseTo(0.5, 12);
    expect(found.range).toMatchObject({ count: 3, without: 1 });
    expect(found.range!.p50).toBeCloseTo(0.5, 12);
  });

  it('needs the water at the aquifer’s temperature: at 10 °C the difference in porosity is 16–20 %', () => {
    const [at25, at10] = [20, 20 / (1 + 0.02 * (10 - 25))];
    for (const [m, low, high] of [
      [2, 0.16, 0.2],
      [2.3, 0.16, 0.2],
    ] as const) {
      const ratio = archiePorosity(at10, { a: 1, m }).of(200)! / archiePorosity(at25, { a: 1, m }).of(200)!;
      expect(ratio - 1).toBeGreaterThan(low);
      expect(ratio - 1).toBeLessThan(high);
    }
  });

  it('warns of clay always, and says so when the water alone cannot explain the ground', () => {
    expect(archieCautions(PLAIN, null, null)).toEqual([expect.stringContaining('Clay conducts by itself')]);
    expect(archieCautions(PLAIN, 200, 20)).toHaveLength(1);
    expect(archieCautions(PLAIN, 15, 20)[1]).toContain('more conductive than its water alone allows');
    expect(archieCautions({ a: 2, m: 1.1 }, null, null).slice(1)).toEqual([
      'a = 2 lies outside of the usual 0.6 to 1.5.',
      'm = 1.1 lies outside of the usual 1.3 to 3.',
    ]);
  });

  it('refuses what cannot be', () => {
    expect(() => formationFactor(1.2, PLAIN)).toThrow(
      'porosity is 1.2; it must be a number above 0 and at most 1',
    );
    expect(() => archieWater(0, PLAIN)).toThrow(InversionError);
    expect(() => archiePorosity(20, { a: 0, m: 2 })).toThrow('a is 0');
    expect(() => archiePorosity(-1, PLAIN)).toThrow('waterOhmM is -1');
    expect(() => archieBulk(0.2, PLAIN).of(0)).toThrow('waterOhmM is 0');
    expect(() => archieWater(0.2, PLAIN).of(NaN)).toThrow('bulkOhmM is NaN');
  });
});
