import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  depthOfInvestigation,
  effectiveDepth,
  layeredDepthOfInvestigation,
  type LayeredEarth,
  type Spread,
} from '../../../inversion';
import { cells, SCHLUMBERGER, soundingOf } from '../support/cell-grounds';

const UNIFORM: LayeredEarth = { resistivity: [100], thickness: [] };
const CONDUCTOR: LayeredEarth = { resistivity: [100, 1, 100], thickness: [3, 30] };
const H_TYPE: LayeredEarth = { resistivity: [100, 10, 500], thickness: [3, 15] };

const enlarged = (by: number): Spread[] =>
  Array.from({ length: 12 }, (_, i) => ({ type: 'wenner', spacing: by * 1.5 ** i }));
const stretched = (earth: LayeredEarth, by: number): LayeredEarth => ({
  ...earth,
  thickness: earth.thickness.map((h) => by * h),
});

describe('depthOfInvestigation', () => {
  it('lets the readings decide where they see, and the references far below', () => {
    const readings = soundingOf(UNIFORM, SCHLUMBERGER, 0.03);
    const { index, edge, references, medianDepth, caution } = depthOfInvestigation(readings, cells('smooth'));
    index
      // about the median depth of the shortest spread (0.4 m) the index swings to −0.14 as it does about the longest's
      .filter(({ depth }) => depth > 0.6 && depth < 90)
      .forEach(({ value }) => expect(Math.abs(value)).toBeLessThan(0.1));
    expect(index.at(-1)!.value).toBeGreaterThan(0.9);
    expect(edge.from!).toBeLessThan(edge.at!);
    expect(edge.at!).toBeLessThan(edge.to!);
    expect(edge.at!).toBeGreaterThan(150);
    expect(edge.at!).toBeLessThan(420);
    expect(references[0] / references[1]).toBeCloseTo(10, 10);
    expect(Math.sqrt(references[0] * references[1]) / 100).toBeCloseTo(1, 1);
    expect(medianDepth).toBe(effectiveDepth(SCHLUMBERGER.at(-1)!));
    expect(caution).toContain('up to 3.6 times deeper');
  });

  it('counts two grounds that cross on their way apart as apart', () => {
    const { index } = depthOfInvestigation(soundingOf(H_TYPE, SCHLUMBERGER, 0.03), cells('smooth'));
    index.forEach(({ value, apart }, i) => {
      expect(apart).toBeGreaterThanOrEqual(Math.abs(value));
      expect(apart).toBeGreaterThanOrEqual(Math.abs(index[Math.max(0, i - 2)]!.value));
    });
  });

  it('is shallower under a strong conductor', () => {
    const at = (earth: LayeredEarth) =>
      depthOfInvestigation(soundingOf(earth, SCHLUMBERGER, 0.03), cells('smooth')).edge.at!;
    expect(at(CONDUCTOR)).toBeLessThan(0.6 * at(UNIFORM));
  });

  it('scales with the ground and the spread', () => {
    const at = (by: number) =>
      depthOfInvestigation(soundingOf(stretched(H_TYPE, by), enlarged(by), 0.02), cells('smooth')).edge;
    expect(at(10).at! / at(1).at!).toBeCloseTo(10, 2);
    expect(at(10).to! / at(1).to!).toBeCloseTo(10, 2);
  });

  it('serves readings whose target is out of reach', () => {
    const readings = soundingOf(H_TYPE, SCHLUMBERGER).map((reading, i) => ({
      ...reading,
      apparentResistivity: reading.apparentResistivity * (i % 2 === 0 ? 1.1 : 0.9),
    }));
    expect(depthOfInvestigation(readings, cells('smooth')).index.at(-1)!.value).toBeGreaterThan(0.9);
  });

  it('refuses what a smooth fit refuses', () => {
    expect(() => depthOfInvestigation([], cells('smooth'))).toThrow('there are no readings');
    expect(() =>
      depthOfInvestigation(soundingOf(H_TYPE, SCHLUMBERGER), cells('smooth', { layers: 3 })),
    ).toThrow('layers is 3');
  });
});

describe('layeredDepthOfInvestigation', () => {
  const planned = (spreads: readonly Spread[], relativeError = 0.03) =>
    spreads.map((spread) => ({ spread, relativeError }));

  it('keeps of a change below what the ground above cannot take up', () => {
    // a half-space: one nuisance value, the resistivity of the part above, so that least squares can be written out
    const { profile } = layeredDepthOfInvestigation(planned(SCHLUMBERGER), UNIFORM);
    const { depth, higher } = profile[44]!;
    const changed = createForwardOperator(SCHLUMBERGER).predict({
      resistivity: [100, 300],
      thickness: [depth],
    });
    const d = Array.from(changed, (value) => Math.log(value / 100) / 0.03);
    const { jacobian } = createForwardOperator(SCHLUMBERGER).predictWithJacobian({
      resistivity: [100, 100],
      thickness: [depth],
    });
    const j = d.map((_, i) => jacobian[3 * i]! / 100 / 0.03);
    const dot = (a: number[], b: number[]) => a.reduce((sum, value, i) => sum + value * b[i]!, 0);
    expect(higher).toBeCloseTo(dot(d, d) - dot(j, d) ** 2 / (dot(j, j) + 1 / Math.LN10 ** 2), 6);
    expect(higher).toBeLessThan(0.96 * dot(d, d));
  });

  it('draws a soft edge: deeper for smaller errors, shallower under a conductor', () => {
    const uniform = layeredDepthOfInvestigation(planned(SCHLUMBERGER), UNIFORM);
    expect(uniform.edge.firm!).toBeGreaterThan(uniform.medianDepth);
    expect(uniform.edge.faint!).toBeGreaterThan(uniform.edge.firm!);
    const sharp = layeredDepthOfInvestigation(planned(SCHLUMBERGER, 0.01), UNIFORM);
    expect(sharp.edge.firm!).toBeGreaterThan(1.2 * uniform.edge.firm!);
    const shielded = layeredDepthOfInvestigation(planned(SCHLUMBERGER), CONDUCTOR);
    expect(shielded.edge.faint!).toBeLessThan(0.4 * uniform.edge.firm!);
  });

  it('meets 3.84 at its edges', () => {
    const { profile, edge } = layeredDepthOfInvestigation(planned(SCHLUMBERGER), H_TYPE);
    for (const [depth, pick] of [
      [edge.firm!, Math.min],
      [edge.faint!, Math.max],
    ] as const) {
      const k = profile.findIndex((at) => at.depth > depth);
      const value = (i: number) => pick(profile[i]!.higher, profile[i]!.lower);
      expect(value(k - 1)).toBeGreaterThanOrEqual(3.84);
      expect(value(k)).toBeLessThan(3.85);
    }
  });

  it('scales with the ground and the spread, also where a depth meets a boundary', () => {
    // the profile's depths are 2^(k/4) times the first, so one of them is the first boundary to the last bit
    const first = layeredDepthOfInvestigation(planned(enlarged(1)), UNIFORM).profile;
    const onGrid: LayeredEarth = { resistivity: [100, 10, 500], thickness: [first[16]!.depth, 15] };
    const small = layeredDepthOfInvestigation(planned(enlarged(1)), onGrid);
    const large = layeredDepthOfInvestigation(planned(enlarged(10)), stretched(onGrid, 10));
    expect(small.profile[16]!.depth).toBe(onGrid.thickness[0]);
    expect(large.edge.firm! / small.edge.firm!).toBeCloseTo(10, 6);
    small.profile.forEach(({ higher }, k) => expect(large.profile[k]!.higher).toBeCloseTo(higher, 4));
  });

  it('has no edge where one reading could be explained by the surface alone', () => {
    const { edge } = layeredDepthOfInvestigation(planned(SCHLUMBERGER.slice(10, 11)), UNIFORM);
    expect(edge.firm).not.toBeNull();
    const blunt = layeredDepthOfInvestigation(planned(SCHLUMBERGER.slice(10, 11), 1), UNIFORM);
    expect(blunt.edge).toEqual({ firm: null, faint: null });
  });

  it('refuses no readings and no earth', () => {
    expect(() => layeredDepthOfInvestigation([], UNIFORM)).toThrow('there are no readings');
    expect(() =>
      layeredDepthOfInvestigation(planned(SCHLUMBERGER), { resistivity: [1, 2], thickness: [] }),
    ).toThrow('thickness has 0 entries');
  });
});
