import { describe, expect, it } from 'vitest';
import { darZarrouk, InversionError } from '../../../inversion';

const EARTH = { resistivity: [10, 50, 200], thickness: [5, 10] };

describe('darZarrouk', () => {
  it('sums the bounded layers', () => {
    const found = darZarrouk(EARTH);
    expect(found.conductanceS).toEqual([0.5, 0.2]);
    expect(found.resistanceOhmM2).toEqual([50, 500]);
    expect(found.totalThicknessM).toBe(15);
    expect(found.totalConductanceS).toBeCloseTo(0.7, 12);
    expect(found.totalResistanceOhmM2).toBe(550);
    expect(found.longitudinalOhmM).toBeCloseTo(15 / 0.7, 12);
    expect(found.transverseOhmM).toBeCloseTo(550 / 15, 12);
  });

  it('sums all ground above a depth, cutting layers and counting the half-space', () => {
    expect(darZarrouk(EARTH, { aboveDepth: 8 }).resistanceOhmM2).toEqual([50, 150]);
    expect(darZarrouk(EARTH, { aboveDepth: 20 }).resistanceOhmM2).toEqual([50, 500, 1000]);
    expect(darZarrouk(EARTH, { aboveDepth: 5 }).totalThicknessM).toBe(5);
  });

  it('sums a run of layers', () => {
    expect(darZarrouk(EARTH, { fromLayer: 1, toLayer: 1 }).totalResistanceOhmM2).toBe(500);
  });

  it('is isotropic for one layer and says nothing of a half-space', () => {
    expect(darZarrouk(EARTH, { fromLayer: 0, toLayer: 0 }).anisotropy).toBeCloseTo(1, 12);
    expect(darZarrouk({ resistivity: [10], thickness: [] })).toMatchObject({
      totalConductanceS: 0,
      anisotropy: null,
      longitudinalOhmM: null,
    });
  });

  it('refuses a part that has no thickness', () => {
    expect(() => darZarrouk(EARTH, { fromLayer: 1, toLayer: 2 })).toThrow(InversionError);
    expect(() => darZarrouk(EARTH, { fromLayer: 1, toLayer: 2 })).toThrow('only the bounded layers 0 to 1');
    expect(() => darZarrouk(EARTH, { aboveDepth: -1 })).toThrow('aboveDepth is -1');
  });
});
