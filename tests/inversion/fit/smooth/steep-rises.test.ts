import { describe, expect, it } from 'vitest';
import type { Reading } from '../../../../inversion';
import { steepRises } from '../../../../inversion/fit/smooth/steep-rises';

const reading = (halfAB: number, apparentResistivity: number, more: Partial<Reading> = {}): Reading => ({
  spread: { type: 'schlumberger', halfAB, halfMN: 0.5 },
  apparentResistivity,
  relativeError: 0.03,
  ...more,
});

describe('steepRises', () => {
  it('finds a rise above +1 in order of spacing, whatever the order of the readings', () => {
    expect(steepRises([reading(10, 100), reading(40, 380), reading(20, 350)])).toEqual([[0, 2]]);
    expect(steepRises([reading(10, 100), reading(20, 190)])).toEqual([]);
  });

  it('leaves a rise that twice its standard error brings to +1', () => {
    // 2.1-fold over a doubling: above +1 by ln 1.05 = 0.049, with two standard errors of 0.085
    expect(steepRises([reading(10, 100), reading(20, 210)])).toEqual([]);
    const sure = { relativeError: 0.01 };
    expect(steepRises([reading(10, 100, sure), reading(20, 210, sure)])).toEqual([[0, 1]]);
  });

  it('does not compare across MN, branches or spacings that are alike', () => {
    const wide = { spread: { type: 'schlumberger', halfAB: 20, halfMN: 5 } } as const;
    expect(steepRises([reading(10, 100), reading(20, 350, wide)])).toEqual([]);
    expect(steepRises([reading(10, 100, { branch: 'a' }), reading(20, 350, { branch: 'b' })])).toEqual([]);
    expect(steepRises([reading(10, 100), reading(10, 350)])).toEqual([]);
  });

  it('leaves out axial dipoles, which may pass +1', () => {
    const dipole = (n: number) => ({ spread: { type: 'dipole-dipole', dipole: 5, n } }) as const;
    expect(steepRises([reading(1, 100, dipole(1)), reading(1, 900, dipole(2))])).toEqual([]);
  });
});
