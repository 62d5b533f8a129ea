import { describe, expect, it } from 'vitest';
import { deriveReading, tryDeriveReading } from '../../../inversion/readings/derive-reading';
import type { FieldReading } from '../../../inversion/readings/field-reading';
import type { Spread } from '../../../inversion/types';

const reading = (spread: Spread, values: Partial<FieldReading> = {}): FieldReading => ({
  spread,
  voltageMv: null,
  currentMa: null,
  resistanceOhm: null,
  sheetApparentResistivityOhmM: null,
  standardError: null,
  excluded: null,
  ...values,
});
const wenner = (spacing: number): Spread => ({ type: 'wenner', spacing });
const dipoles: Spread = { type: 'dipole-dipole', dipole: 5, n: 2 };

describe('deriveReading', () => {
  // CSIR-NET Earth Sciences 2014: seen in print
  it.each([
    [25, 4, 628],
    [50, 3, 942],
    [75, 1, 471],
  ])('gives the printed ρa of a Wenner spread of %d m and %d Ω', (spacing, resistanceOhm, printed) => {
    const derived = deriveReading(reading(wenner(spacing), { resistanceOhm }), 0.03);
    expect(Math.abs(derived.apparentResistivityOhmM - printed)).toBeLessThan(0.5);
    expect(derived.plottingSpacingM).toBe(1.5 * spacing);
  });

  it('takes V and I before R, and R before the ρa of the sheet', () => {
    const all = { voltageMv: 20, currentMa: 10, resistanceOhm: 3, sheetApparentResistivityOhmM: 1 };
    const k = 2 * Math.PI;
    const rhoa = (values: Partial<FieldReading>) =>
      deriveReading(reading(wenner(1), values), 0).apparentResistivityOhmM;
    expect(rhoa(all)).toBeCloseTo(2 * k, 12);
    expect(rhoa({ ...all, voltageMv: null })).toBeCloseTo(3 * k, 12);
    expect(rhoa({ sheetApparentResistivityOhmM: 1 })).toBe(1);
  });

  it('adds the own error and the floor in quadrature', () => {
    const values = { resistanceOhm: 1, standardError: 0.04 };
    expect(deriveReading(reading(wenner(1), values), 0.03).relativeError).toBeCloseTo(0.05, 15);
  });

  it('uses the ρa of the sheet, and gives no K, where MN was not recorded', () => {
    const spread: Spread = { type: 'schlumberger', halfAB: 10, halfMN: null };
    const derived = deriveReading(
      reading(spread, { voltageMv: 2, currentMa: 10, sheetApparentResistivityOhmM: 88 }),
      0.03,
    );
    expect(derived).toMatchObject({
      geometricFactorM: null,
      apparentResistivityOhmM: 88,
      resistanceOhm: 0.2,
    });
    expect(tryDeriveReading(reading(spread, { voltageMv: 2, currentMa: 10 }), 0.03).fault).toMatchObject({
      field: 'halfMN',
    });
  });

  it('gives a dipole–dipole read in the order A B M N a K below 0, and the other order a K above 0', () => {
    const k = Math.PI * 5 * 2 * 3 * 4;
    const against = deriveReading(reading(dipoles, { voltageMv: -4, currentMa: 100 }), 0);
    expect(against.geometricFactorM).toBeCloseTo(-k, 9);
    expect(against.apparentResistivityOhmM).toBeCloseTo(k * 0.04, 9);
    const along = deriveReading(reading(dipoles, { voltageMv: 4, currentMa: 100 }), 0);
    expect(along.geometricFactorM).toBeCloseTo(k, 9);
  });

  it.each([
    [{ voltageMv: -4, currentMa: 100 }, 'voltage', /K·V\/I gives -/],
    [{ resistanceOhm: -1 }, 'resistance', /K·V\/I gives -/],
    [{ voltageMv: 0, currentMa: 100 }, 'voltage', /gives 0/],
    [{ voltageMv: 4, currentMa: 0 }, 'current', /no current/],
    [{ voltageMv: 4 }, 'current', /no ρa follows/],
    [{ currentMa: 4 }, 'voltage', /no ρa follows/],
    [{}, 'apparentResistivity', /no ρa follows/],
  ])('refuses %o', (values, field, message) => {
    const { fault } = tryDeriveReading(reading(wenner(1), values), 0.03);
    expect(fault?.field).toBe(field);
    expect(fault?.message).toMatch(message);
  });

  it('refuses electrodes whose bracket cancels', () => {
    const spread: Spread = { type: 'electrodes', am: 1, an: 1, bm: 2, bn: 2 };
    expect(tryDeriveReading(reading(spread, { resistanceOhm: 1 }), 0).fault?.message).toMatch(/cancels/);
    expect(() => deriveReading(reading(spread, { resistanceOhm: 1 }), 0)).toThrow(/cancels/);
  });
});
