import { describe, expect, it } from 'vitest';
import { PROTECTIVE_CLASSES, protectiveCapacity, protectiveClass } from '../../../inversion';

describe('protective capacity', () => {
  it('has one class for every conductance: an end belongs to the class above it', () => {
    // classes after Henriet 1976, from memory
    const found = [0, 0.05, 0.1, 0.19, 0.2, 0.69, 0.7, 4.99, 5, 9.99, 10, 200].map(protectiveClass);
    expect(found.join()).toBe(
      'poor,poor,weak,weak,moderate,moderate,good,good,very good,very good,excellent,excellent',
    );
    PROTECTIVE_CLASSES.slice(1).forEach(({ from }, i) => expect(from).toBe(PROTECTIVE_CLASSES[i]!.to));
  });

  it('gives the chance of each class over an ensemble', () => {
    const { class: best, chances } = protectiveCapacity(0.3, [0.15, 0.3, 0.5, 0.8]);
    expect(best).toBe('moderate');
    expect(chances!.map(({ chance }) => chance)).toEqual([0, 0.25, 0.5, 0.25, 0, 0]);
    expect(protectiveCapacity(0.3).chances).toBeNull();
  });

  it('refuses a conductance that cannot be', () => {
    expect(() => protectiveClass(-0.1)).toThrow('conductanceS is -0.1');
    expect(() => protectiveClass(NaN)).toThrow('conductanceS is NaN');
  });
});
