import { describe, expect, it } from 'vitest';
import {
  aquiferWaterResistivity,
  conductivityAt,
  conductivityAt25,
  deriveWithRange,
  dissolvedSolids,
  waterConductivity,
  waterResistivity,
} from '../../../inversion';

// ρ_w = 10 000/EC, 2 % a degree and 0.55–0.75 after Hem 1985, from memory
describe('conductivity of a water', () => {
  it('turns EC into resistivity and back', () => {
    expect(waterResistivity(500)).toBe(20);
    expect(waterConductivity(20)).toBe(500);
  });

  it('carries EC between its own temperature and 25 °C', () => {
    expect(conductivityAt25(350, 10)).toBeCloseTo(500, 12);
    expect(conductivityAt(500, 10)).toBeCloseTo(350, 12);
    expect(conductivityAt25(500, 25)).toBe(500);
  });

  it('gives the water that Archie’s law needs, with the range of the samples', () => {
    const water = deriveWithRange(aquiferWaterResistivity(10), 500, [400, 500, 625]);
    expect(water.value).toBeCloseTo(10_000 / 350, 10);
    expect(water.range!.p50).toBeCloseTo(10_000 / 350, 10);
    expect(water.range!.p95).toBeGreaterThan(34);
  });

  it('gives dissolved solids as a range', () => {
    const solids = dissolvedSolids(1000);
    expect(solids.low).toBeCloseTo(550, 10);
    expect(solids.high).toBeCloseTo(750, 10);
  });

  it('refuses what no water has', () => {
    expect(() => waterResistivity(0)).toThrow('ecUsCm is 0; it must be a number above 0 µS/cm');
    expect(() => waterConductivity(-2)).toThrow('waterOhmM is -2');
    expect(() => conductivityAt25(500, -26)).toThrow('temperatureC is -26');
    expect(() => conductivityAt(500, 99)).toThrow('at most 60 °C');
    expect(() => dissolvedSolids(NaN)).toThrow('ec25UsCm is NaN');
  });
});
