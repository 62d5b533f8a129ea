import { boundaryDepths } from '../../../../src/charts/chart-data';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  modelFromCurve,
  withBedSplit,
  withBoundary,
  withoutBed,
  withValue,
} from '../../../../src/features/bench/hand-model';

const earth = { resistivity: [140, 12, 120, 11], thickness: [3, 3, 36] };

describe('withValue', () => {
  it('changes one value and nothing else', () => {
    expect(withValue(earth, { on: 'resistivity', index: 1 }, 20)).toEqual({
      resistivity: [140, 20, 120, 11],
      thickness: [3, 3, 36],
    });
  });
  it('keeps the model for a value that is no length, and for a bed that is not there', () => {
    expect(withValue(earth, { on: 'thickness', index: 0 }, -1)).toBe(earth);
    expect(withValue(earth, { on: 'thickness', index: 3 }, 4)).toBe(earth);
    expect(withValue(earth, { on: 'resistivity', index: 0 }, Number.NaN)).toBe(earth);
  });
});

describe('withBoundary', () => {
  it('leaves the boundary below where it is', () => {
    const moved = withBoundary(earth, 0, 4);
    expect(moved.thickness).toEqual([4, 2, 36]);
    expect(boundaryDepths(moved)).toEqual([4, 6, 42]);
  });
  it('moves the lowest boundary freely', () => {
    expect(withBoundary(earth, 2, 50).thickness).toEqual([3, 3, 44]);
  });
  it('never passes a neighbour', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 2 }),
        fc.double({ min: -10, max: 1e4, noNaN: true }),
        (index, depth) => {
          const moved = withBoundary(earth, index, depth);
          expect(moved.thickness.every((thickness) => thickness > 0)).toBe(true);
          const others = (model: typeof earth) => boundaryDepths(model).filter((_, i) => i !== index);
          others(moved).forEach((base, i) => expect(base).toBeCloseTo(others(earth)[i] ?? 0, 9));
        },
      ),
    );
  });
});

describe('beds', () => {
  it('splits a bed into halves that say the same', () => {
    expect(withBedSplit(earth, 2)).toEqual({
      resistivity: [140, 12, 120, 120, 11],
      thickness: [3, 3, 18, 18],
    });
  });
  it('splits the half-space below the depth above it', () => {
    expect(withBedSplit(earth, 3)).toEqual({
      resistivity: [140, 12, 120, 11, 11],
      thickness: [3, 3, 36, 42],
    });
  });
  it('stops at eight beds', () => {
    const eight = { resistivity: Array<number>(8).fill(10), thickness: Array<number>(7).fill(1) };
    expect(withBedSplit(eight, 0)).toBe(eight);
  });
  it('lets the bed below grow into the place of one taken away', () => {
    expect(withoutBed(earth, 1)).toEqual({ resistivity: [140, 120, 11], thickness: [3, 39] });
    expect(withoutBed(earth, 2)).toEqual({ resistivity: [140, 12, 11], thickness: [3, 3] });
    expect(withoutBed(earth, 3)).toEqual({ resistivity: [140, 12, 120], thickness: [3, 3] });
  });
  it('keeps the last bed', () => {
    const one = { resistivity: [50], thickness: [] };
    expect(withoutBed(one, 0)).toBe(one);
  });
});

describe('modelFromCurve', () => {
  it('takes its values from the curve, whatever the order of the readings', () => {
    const readings = [
      { spacing: 100, apparentResistivity: 30 },
      { spacing: 1, apparentResistivity: 140 },
      { spacing: 10, apparentResistivity: 52 },
    ];
    expect(modelFromCurve(readings)).toEqual({ resistivity: [140, 52, 30], thickness: [1, 6] });
  });
  it('gives none without readings and one bed for two', () => {
    expect(modelFromCurve([])).toBeNull();
    expect(modelFromCurve([{ spacing: 1, apparentResistivity: 10 }])).toEqual({
      resistivity: [10],
      thickness: [],
    });
  });
});
