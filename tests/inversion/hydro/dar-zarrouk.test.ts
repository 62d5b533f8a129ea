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

  it('sums the ground between two depths, and the whole is the sum of its parts', () => {
    expect(darZarrouk(EARTH, { fromDepth: 2, toDepth: 20 }).resistanceOhmM2).toEqual([30, 500, 1000]);
    expect(darZarrouk(EARTH, { fromDepth: 30, toDepth: 40 }).conductanceS).toEqual([0.05]);
    const upper = darZarrouk(EARTH, { fromDepth: 0, toDepth: 7 }).totalConductanceS;
    const lower = darZarrouk(EARTH, { fromDepth: 7, toDepth: 20 }).totalConductanceS;
    expect(upper + lower).toBeCloseTo(darZarrouk(EARTH, { aboveDepth: 20 }).totalConductanceS, 14);
  });

  it('gives the anisotropy that an examination paper and a sum by hand give', () => {
    // GATE Geophysics 2016 prints 1.308; the second pair is worked out by hand: S 2.1, T 1200
    expect(darZarrouk(EARTH, { aboveDepth: 15 }).anisotropy).toBeCloseTo(1.30809, 5);
    const pair = darZarrouk({ resistivity: [100, 10, 1], thickness: [10, 20] });
    expect(pair.totalConductanceS).toBeCloseTo(2.1, 12);
    expect(pair.totalResistanceOhmM2).toBe(1200);
    expect(pair.anisotropy).toBeCloseTo(1.6733, 4);
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
    expect(() => darZarrouk(EARTH, { fromDepth: 5, toDepth: 5 })).toThrow('depths 5 to 5 m were asked for');
    expect(() => darZarrouk(EARTH, { fromDepth: -1, toDepth: 5 })).toThrow('depths -1 to 5 m');
  });
});
