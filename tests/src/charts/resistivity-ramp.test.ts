import { describe, expect, test } from 'vitest';
import {
  contrastRatio,
  hexToLinearRgb,
  hexToOklab,
  linearRgbToOklab,
  oklabDistance,
  type LinearRgb,
  type Oklab,
} from '../../../src/charts/oklab';
import { rampStops, rampColor, textColorOn } from '../../../src/charts/resistivity-ramp';

const samples = Array.from({ length: 81 }, (_, i) => 10 ** (i / 20));
const labs = samples.map((resistivity) => hexToOklab(rampColor(resistivity)));
const steps = (points: Oklab[]) => points.slice(1).map((point, i) => oklabDistance(points[i]!, point));

/** Viénot, Brettel and Mollon (1999), linear RGB. */
const SIGHT: Record<string, readonly LinearRgb[]> = {
  protan: [
    [0.11238, 0.88762, 0],
    [0.11238, 0.88762, 0],
    [0.00401, -0.00401, 1],
  ],
  deutan: [
    [0.29275, 0.70725, 0],
    [0.29275, 0.70725, 0],
    [-0.02234, 0.02234, 1],
  ],
};

function seenBy(kind: string, hex: string): Oklab {
  const rgb = hexToLinearRgb(hex);
  const row = (weights: LinearRgb) => weights[0] * rgb[0] + weights[1] * rgb[1] + weights[2] * rgb[2];
  const [red, green, blue] = SIGHT[kind]!.map((weights) => Math.max(0, row(weights)));
  return linearRgbToOklab([red!, green!, blue!]);
}

describe('resistivity ramp', () => {
  test('steps of a fifth of a decade are even in OKLab', () => {
    const distances = steps(labs.filter((_, i) => i % 4 === 0));
    const mean = distances.reduce((sum, step) => sum + step, 0) / distances.length;
    expect(mean).toBeGreaterThan(0.01);
    for (const step of distances) expect(Math.abs(step / mean - 1)).toBeLessThan(0.08);
  });

  test('lightness grows with resistivity at every step', () => {
    labs.slice(1).forEach((lab, i) => expect(lab.l).toBeGreaterThan(labs[i]!.l));
    expect(labs.at(-1)!.l - labs[0]!.l).toBeGreaterThan(0.6);
  });

  test.each(['protan', 'deutan'])('keeps its order and its distance for %s sight', (kind) => {
    const seen = samples.filter((_, i) => i % 5 === 0).map((value) => seenBy(kind, rampColor(value)));
    seen.slice(1).forEach((lab, i) => expect(lab.l).toBeGreaterThan(seen[i]!.l));
    for (const step of steps(seen)) expect(step).toBeGreaterThan(0.03);
  });

  test('text stands out by at least 4.5 to 1 on every colour', () => {
    for (const resistivity of samples) {
      const color = rampColor(resistivity);
      expect(contrastRatio(color, textColorOn(color))).toBeGreaterThanOrEqual(4.5);
    }
  });

  test('ends hold outside the range', () => {
    expect(rampColor(0.01)).toBe(rampColor(1));
    expect(rampColor(1e6)).toBe(rampColor(10_000));
  });

  test('legend stops are the colours of the same values', () => {
    const stops = rampStops(5);
    expect(stops.map((stop) => stop.color)).toEqual([1, 10, 100, 1000, 10_000].map(rampColor));
    expect(stops.map((stop) => stop.offset)).toEqual([0, 0.25, 0.5, 0.75, 1]);
  });
});
