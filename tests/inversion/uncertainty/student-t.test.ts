import { describe, expect, it } from 'vitest';
import { studentChance, studentPoint } from '../../../inversion/uncertainty/student-t';

describe('Student’s t', () => {
  it('is the arc tangent for one degree of freedom and a square root for two', () => {
    for (const t of [-40, -3, -0.2, 0, 0.01, 1, 7, 300]) {
      expect(studentChance(t, 1)).toBeCloseTo(0.5 + Math.atan(t) / Math.PI, 12);
      expect(studentChance(t, 2)).toBeCloseTo(0.5 + t / (2 * Math.sqrt(2 + t * t)), 12);
    }
  });

  it('has the points of the printed tables', () => {
    // from memory, as every statistics text prints them
    expect(studentPoint(0.975, 2)).toBeCloseTo(4.3027, 4);
    expect(studentPoint(0.95, 5)).toBeCloseTo(2.015, 3);
    expect(studentPoint(0.975, 10)).toBeCloseTo(2.2281, 4);
    expect(studentPoint(0.025, 10)).toBe(-studentPoint(0.975, 10));
    expect(studentPoint(0.995, 120)).toBeCloseTo(2.6174, 4);
    expect(studentPoint(0.5, 4)).toBeCloseTo(0, 14);
  });
});
