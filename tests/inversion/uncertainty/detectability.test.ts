import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  createRandomStream,
  detectability,
  type LayeredEarth,
  type PlannedReading,
  type Spread,
} from '../../../inversion';
import { createNuisance } from '../../../inversion/uncertainty/nuisance';
import { chanceToTell, normalChance } from '../../../inversion/uncertainty/telling-apart';
import { layered } from '../support/fit-settings';

const { bounds } = layered(1);
const spreadsTo = (count: number, ratio: number): Spread[] =>
  Array.from({ length: count }, (_, i) => ({ type: 'schlumberger', halfAB: ratio ** i, halfMN: null }));
const planned = (spreads: readonly Spread[], relativeError = 0.03): PlannedReading[] =>
  spreads.map((spread) => ({ spread, relativeError }));

const WITHOUT: LayeredEarth = { resistivity: [100, 20, 400], thickness: [4, 30] };
const WITH: LayeredEarth = { resistivity: [100, 20, 80, 400], thickness: [4, 12, 15] };
const READINGS = planned(spreadsTo(14, 1.5));

describe('chanceToTell', () => {
  it('is 5 % without a difference and follows the normal distribution', () => {
    expect(chanceToTell(0)).toBeCloseTo(0.05, 12);
    expect(chanceToTell(1.6448536269514722 ** 2)).toBeCloseTo(0.5, 12);
    // Φ(1), Φ(−1.96) of the printed tables
    expect(normalChance(1)).toBeCloseTo(0.841345, 6);
    expect(normalChance(-1.96)).toBeCloseTo(0.024998, 6);
  });

  it('is the share of noisy soundings that show which of two grounds is there', () => {
    const operator = createForwardOperator(READINGS.map(({ spread }) => spread));
    const [a, b] = [operator.predict(WITH), operator.predict(WITHOUT)];
    const d = Array.from(a, (value, i) => Math.log(value / b[i]!) / 0.5);
    const random = createRandomStream(3);
    let shown = 0;
    const draws = 4000;
    // χ² of the other ground minus that of the true one, against the 95 % point it has when the other one is true
    const square = d.reduce((sum, value) => sum + value * value, 0);
    const limit = -square + 2 * 1.6448536269514722 * Math.sqrt(square);
    for (let k = 0; k < draws; k++) {
      const noise = d.map(() => random.normal());
      const delta = d.reduce((sum, value, i) => sum + (value + noise[i]!) ** 2 - noise[i]! ** 2, 0);
      if (delta > limit) shown++;
    }
    const { stated } = detectability({
      first: WITH,
      second: WITHOUT,
      readings: planned(spreadsTo(14, 1.5), 0.5),
      bounds,
    });
    expect(stated.deltaChi2).toBeCloseTo(square, 9);
    // three standard errors
    expect(Math.abs(stated.chance - shown / draws)).toBeLessThan(0.024);
    expect(stated.chance).toBeGreaterThan(0.2);
    expect(stated.chance).toBeLessThan(0.97);
  });
});

describe('detectability', () => {
  it('says less after a refit, and nothing where the refitted ground holds the true one', () => {
    const found = detectability({ first: WITH, second: WITHOUT, readings: READINGS, bounds });
    expect(found.firstTrue.deltaChi2).toBeLessThan(found.stated.deltaChi2);
    expect(found.firstTrue.deltaChi2).toBeGreaterThan(0);
    expect(found.firstTrue.other.resistivity).toHaveLength(3);
    expect(found.secondTrue.deltaChi2).toBeLessThan(1e-3);
    expect(found.secondTrue.chance).toBeCloseTo(0.05, 2);
    expect(found.stated.next).toBeNull();
    const swapped = detectability({ first: WITHOUT, second: WITH, readings: READINGS, bounds });
    expect(swapped.stated.deltaChi2).toBeCloseTo(found.stated.deltaChi2, 9);
    expect(swapped.secondTrue.deltaChi2).toBeCloseTo(found.firstTrue.deltaChi2, 9);
  });

  it('finds a hidden middle layer as hidden as image series do', () => {
    // 10/31.6/100, h₁ = 10, AB/2 1–1000 m: rms by which two layers miss a middle layer of h₂, computed with image series
    for (const [h2, rms] of [
      [3, 0.11],
      [5, 0.3],
      [10, 1],
    ] as const) {
      const { firstTrue } = detectability({
        first: { resistivity: [10, 31.6, 100], thickness: [10, h2] },
        second: { resistivity: [10, 100], thickness: [10 + h2] },
        readings: planned(spreadsTo(31, 1000 ** (1 / 30)), 0.01),
        bounds,
      });
      const found = Math.sqrt(firstTrue.deltaChi2 / 31);
      expect(found / rms).toBeGreaterThan(0.8);
      expect(found / rms).toBeLessThan(1.25);
    }
  });

  it('names the one candidate that helps most, as adding each in turn does', () => {
    const candidates = planned(
      [2.3, 9, 40, 90, 400].map((halfAB) => ({ type: 'schlumberger', halfAB, halfMN: null })),
      0.01,
    );
    const input = { first: WITH, second: WITHOUT, readings: READINGS, bounds };
    const { stated, firstTrue } = detectability({ ...input, candidates });
    const added = candidates.map((one) => detectability({ ...input, readings: [...READINGS, one] }));
    const best = (key: 'stated' | 'firstTrue') =>
      added.reduce((top, one, i) => (one[key].deltaChi2 > added[top]![key].deltaChi2 ? i : top), 0);
    expect(stated.next!.candidate).toBe(best('stated'));
    expect(stated.next!.deltaChi2).toBeCloseTo(added[best('stated')]!.stated.deltaChi2, 8);
    expect(firstTrue.next!.candidate).toBe(best('firstTrue'));
    expect(firstTrue.next!.deltaChi2 / added[best('firstTrue')]!.firstTrue.deltaChi2).toBeCloseTo(1, 1);
    expect(firstTrue.next!.chance).toBe(chanceToTell(firstTrue.next!.deltaChi2));
    expect(firstTrue.next!.chance).toBeGreaterThan(firstTrue.chance);
  });

  it('refuses plans that cannot be', () => {
    const input = { first: WITH, second: WITHOUT, readings: READINGS, bounds };
    expect(() => detectability({ ...input, readings: [] })).toThrow('no reading is planned');
    expect(() => detectability({ ...input, second: { resistivity: [], thickness: [] } })).toThrow(
      'resistivity is empty',
    );
    expect(() => detectability({ ...input, candidates: planned(spreadsTo(1, 2), 0) })).toThrow(
      'relativeError is 0',
    );
  });
});

describe('createNuisance', () => {
  it('is least squares with each value free within about tenfold', () => {
    const j = [1, 2, -1, 0.5];
    const d = [3, 1, 0.5, -2];
    const nuisance = createNuisance(Float64Array.from(j), 4, 1);
    const jj = 6.25 + 1 / Math.LN10 ** 2;
    expect(nuisance.remains(d)).toBeCloseTo(14.25 - 3.5 ** 2 / jj, 12);
    expect(nuisance.variance([2])).toBeCloseTo(4 / jj, 12);
    const two = createNuisance(Float64Array.from([1e3, 0, 0, 1e3]), 2, 2);
    expect(two.remains([5, -7])).toBeLessThan(1e-3);
  });
});
