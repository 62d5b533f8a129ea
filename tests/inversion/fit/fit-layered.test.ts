import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  createOperatorCache,
  createRandomStream,
  ENGINE_VERSION,
  fitLayered,
  fitStatusMessage,
  InversionError,
  type FitProgress,
  type FitResult,
  type FitSettings,
  type LayeredEarth,
  type Reading,
  type Spread,
} from '../../../inversion';
import { MODERATION } from '../../../inversion/fit/moderate-model';
import { inversionCases, type InversionCase } from '../support/read-reference';
import { layered } from '../support/fit-settings';

function readingsOf(one: InversionCase): Reading[] {
  return one.readings.map((r) => ({
    spread: { type: 'schlumberger', halfAB: r.halfAB, halfMN: r.halfMN },
    apparentResistivity: r.rhoa,
    relativeError: one.relative_error,
  }));
}

function sounding(earth: LayeredEarth, spreads: readonly Spread[], noise = 0, error = 0.03): Reading[] {
  const random = createRandomStream(31);
  return Array.from(createForwardOperator(spreads).predict(earth), (value, i) => ({
    spread: spreads[i]!,
    apparentResistivity: value * Math.exp(noise * random.normal()),
    relativeError: error,
  }));
}

const WENNER = Array.from({ length: 14 }, (_, i): Spread => ({ type: 'wenner', spacing: 1.5 ** i }));
const H_TYPE = { resistivity: [100, 10, 1000], thickness: [3, 10] };

describe('fitLayered', () => {
  it('reaches the best known misfit of all 60 reference soundings', { timeout: 120_000 }, () => {
    const missed = inversionCases().flatMap((one) => {
      const fit = fitLayered(readingsOf(one), layered(one.layers));
      return fit.chi2PerReading <= 1.05 * one.best_chi2_per_datum + 0.02 ? [] : [one.id];
    });
    expect(missed).toEqual([]);
  });

  it('finds the ground again from readings without noise, for every kind of spread together', () => {
    const spreads: Spread[] = [
      ...WENNER,
      { type: 'schlumberger', halfAB: 30, halfMN: 1 },
      { type: 'half-schlumberger', halfAB: 60, halfMN: 5 },
      { type: 'pole-pole', spacing: 25 },
      { type: 'dipole-dipole', dipole: 10, n: 4 },
      { type: 'electrodes', am: 7, an: 20, bm: 31, bn: 16 },
    ];
    const fit = fitLayered(sounding(H_TYPE, spreads), layered(3));
    H_TYPE.resistivity.forEach((rho, i) => expect(fit.earth.resistivity[i]! / rho).toBeCloseTo(1, 3));
    H_TYPE.thickness.forEach((h, i) => expect(fit.earth.thickness[i]! / h).toBeCloseTo(1, 3));
    expect(fit.engine).toBe(ENGINE_VERSION);
    expect(fit.geometricFactor[0]).toBeCloseTo(2 * Math.PI, 10);
  });

  it('gives the same bits for the same input, with or without kept operators, and changes nothing it was given', () => {
    const readings = sounding(H_TYPE, WENNER, 0.03);
    const settings = layered(4, { seed: 12 });
    const before = structuredClone({ readings, settings });
    const first = fitLayered(readings, settings);
    expect(fitLayered(readings, settings)).toEqual(first);
    const operators = createOperatorCache();
    fitLayered(readings, layered(2), { operators });
    expect(fitLayered(readings, settings, { operators })).toEqual(first);
    expect({ readings, settings }).toEqual(before);
  });

  it('reports what it predicts: residuals, χ² and rms agree with the predictions', () => {
    const readings = sounding(H_TYPE, WENNER, 0.05);
    const fit = fitLayered(readings, layered(2));
    const predicted = createForwardOperator(WENNER).predict(fit.earth);
    expect(fit.predicted).toEqual(Array.from(predicted));
    let chi2 = 0;
    let squares = 0;
    readings.forEach((reading, i) => {
      const residual = Math.log(predicted[i]! / reading.apparentResistivity) / 0.03;
      expect(fit.residuals[i]).toBeCloseTo(residual, 9);
      chi2 += residual ** 2;
      squares += (predicted[i]! / reading.apparentResistivity - 1) ** 2;
    });
    expect(fit.chi2PerReading).toBeCloseTo(chi2 / readings.length, 9);
    expect(fit.rmsPercent).toBeCloseTo(100 * Math.sqrt(squares / readings.length), 9);
  });

  it('holds fixed values exactly and fits the rest', () => {
    const readings = sounding(H_TYPE, WENNER, 0.02);
    const fixed = [
      { on: 'resistivity', index: 2, value: 700 },
      { on: 'thickness', index: 0, value: 3.3 },
    ] as const;
    const fit = fitLayered(readings, layered(3, { fixed }));
    expect(fit.earth.resistivity[2]).toBe(700);
    expect(fit.earth.thickness[0]).toBe(3.3);
    expect(fit.intervals.resistivity[2]).toEqual([700, 700]);
    expect(fit.intervals.thickness[0]).toEqual([3.3, 3.3]);
    expect(fit.correlation[2]).toEqual([null, null, null, null, null]);
    expect(fit.chi2PerReading).toBeLessThan(6);
  });

  it('keeps to its bounds, and says which bed ended on one', () => {
    const bounds = { resistivity: [20, 500], thickness: [0.5, 8] } as const;
    const fit = fitLayered(sounding(H_TYPE, WENNER), layered(3, { bounds }));
    fit.earth.resistivity.forEach((rho) => {
      expect(rho).toBeGreaterThanOrEqual(20 * (1 - 1e-12));
      expect(rho).toBeLessThanOrEqual(500 * (1 + 1e-12));
    });
    fit.earth.thickness.forEach((h) => expect(h).toBeLessThanOrEqual(8 * (1 + 1e-12)));
    expect(fit.warnings.join(' ')).toContain(
      'The thickness of bed 2 ended on its upper bound (8 m); a closer fit may lie beyond it.',
    );
  });

  it('uses a start of the user', () => {
    const readings = sounding(H_TYPE, WENNER, 0.02);
    const plain = fitLayered(readings, layered(3));
    const helped = fitLayered(readings, layered(3, { start: H_TYPE }));
    expect(helped.starts).toBe(plain.starts + 1);
    expect(helped.chi2PerReading).toBeLessThan(plain.chi2PerReading * 1.0001);
  });

  it('reports progress of every start, and its misfit', () => {
    const seen: FitProgress[] = [];
    const fit = fitLayered(sounding(H_TYPE, WENNER, 0.02), layered(3), { onProgress: (p) => seen.push(p) });
    expect(new Set(seen.map((p) => p.layers))).toEqual(new Set([3]));
    expect(Math.max(...seen.map((p) => p.start))).toBe(fit.starts);
    const least = seen.at(-1)!.chi2PerReading;
    expect(fit.chi2PerReading).toBeGreaterThan(0.999999 * least);
    expect(fit.chi2PerReading).toBeLessThanOrEqual(1.0000001 * (1 + MODERATION) * least);
  });

  it('warns of a misfit that the errors do not explain, with the scaled alternative, and rescales nothing', () => {
    const readings = sounding(H_TYPE, WENNER, 0.05, 0.01);
    const careful = fitLayered(
      readings.map((r) => ({ ...r, relativeError: 0.05 })),
      layered(3),
    );
    const bold = fitLayered(readings, layered(3));
    expect(bold.misfitProbability).toBeLessThan(0.01);
    expect(bold.warnings[0]).toMatch(/times as large/);
    const scale = Number(/would be ([\d.]+) times/.exec(bold.warnings[0]!)![1]);
    expect(scale).toBeCloseTo(Math.sqrt((bold.chi2PerReading * 14) / 9), 1);
    expect(careful.misfitProbability).toBeGreaterThan(0.01);
    expect(careful.warnings).toEqual([]);
    const width = ({ intervals }: FitResult) =>
      Math.log(intervals.resistivity[0]![1]! / intervals.resistivity[0]![0]!);
    expect(width(careful) / width(bold)).toBeCloseTo(5, 0);
  });

  it('says that a misfit is too small for the stated errors, from a chance of 0.5 % on', () => {
    const random = createRandomStream(5);
    const scatter = WENNER.map(() => 0.03 * random.normal());
    const fitAt = (relativeError: number) =>
      fitLayered(
        sounding(H_TYPE, WENNER).map((reading, i) => ({
          ...reading,
          apparentResistivity: reading.apparentResistivity * Math.exp(scatter[i]!),
          relativeError,
        })),
        layered(3),
      );
    const honest = fitAt(0.03);
    expect(honest.warnings).toEqual([]);
    const chance = (fit: FitResult) => 1 - fit.misfitProbability!;
    const timid = [0.04, 0.05, 0.06, 0.08, 0.1].map(fitAt);
    expect(timid.some((fit) => chance(fit) > 0.005)).toBe(true);
    expect(timid.some((fit) => chance(fit) < 0.005)).toBe(true);
    expect(timid.map((fit) => fit.warnings.length)).toEqual(
      timid.map((fit) => (chance(fit) < 0.005 ? 1 : 0)),
    );
    expect(timid.at(-1)!.warnings[0]).toMatch(
      /^χ²\/N 0\.\d+ is smaller than such errors would give \(chance .* %\): the stated errors are probably too large, and the ranges too wide\.$/,
    );
  });

  it('says that the ideal gradient stood in for an unrecorded MN', () => {
    const spreads = WENNER.map((_, i): Spread => ({
      type: 'schlumberger',
      halfAB: 1.5 ** i,
      halfMN: i === 3 ? null : 0.2,
    }));
    const fit = fitLayered(sounding(H_TYPE, spreads), layered(3));
    expect(fit.geometricFactor[3]).toBeNull();
    expect(fit.warnings.join(' ')).toContain('MN was not recorded for reading 4: ');
  });

  it('joins the numbers of readings that follow one another', () => {
    const missing = new Set([0, 1, 2, 5, 7, 8]);
    const spreads = WENNER.map((_, i): Spread => ({
      type: 'schlumberger',
      halfAB: 1.5 ** i,
      halfMN: missing.has(i) ? null : 0.2,
    }));
    expect(fitLayered(sounding(H_TYPE, spreads), layered(2)).warnings.join(' ')).toContain(
      'for readings 1–3, 6, 8, 9: the ideal gradient',
    );
  });

  it('tells of another ground that fits alike, and its intervals reach over both', () => {
    const one = inversionCases().find(({ id }) => id === '211-35')!;
    const fit = fitLayered(readingsOf(one), layered(one.layers));
    const words =
      /^Another model fits nearly as well \(χ²\/N [\d.]+ against [\d.]+\): (.*) Ω·m over thicknesses (.*) m\./;
    const [, resistivity, thickness] = fit.warnings.flatMap((warning) => words.exec(warning) ?? []);
    for (const [on, list] of [
      ['resistivity', resistivity],
      ['thickness', thickness],
    ] as const)
      list!.split(', ').forEach((value, i) => {
        const [low, high] = fit.intervals[on][i]!;
        expect(Number(value)).toBeGreaterThan((low ?? 0) * 0.99);
        expect(Number(value)).toBeLessThan((high ?? Infinity) * 1.01);
      });
  });

  it('names a predicted ρa of zero or less and still fits the other readings', () => {
    const odd: Spread = { type: 'electrodes', am: 25.6, an: 66.8, bm: 18.3, bn: 37.5 };
    expect(createForwardOperator([odd]).predict(H_TYPE)[0]).toBeLessThan(0);
    const readings: Reading[] = [
      ...sounding(H_TYPE, WENNER),
      { spread: odd, apparentResistivity: 1, relativeError: 1 },
    ];
    const fit = fitLayered(
      readings.map((r, i) => (i < 14 ? { ...r, relativeError: 1e-4 } : r)),
      layered(3),
    );
    expect(fit.predicted[14]).toBeLessThan(0);
    expect(fit.warnings.join(' ')).toContain('zero or less for reading 15');
    expect(fit.residuals.every(Number.isFinite)).toBe(true);
  });

  it('has a sentence for every stop reason it gives', () => {
    const fit = fitLayered(sounding(H_TYPE, WENNER, 0.02), layered(3));
    expect(fitStatusMessage(fit.status)).toMatch(/\.$/);
    expect(fit.status).toMatch(/^converged-/);
  });
});

describe('fitLayered with few readings', () => {
  const one: Reading[] = [
    { spread: { type: 'wenner', spacing: 10 }, apparentResistivity: 73, relativeError: 0.03 },
  ];

  it('fits one layer to one reading, exactly', () => {
    const fit = fitLayered(one, layered(1));
    expect(fit.earth.resistivity[0]).toBeCloseTo(73, 9);
    expect(fit.intervals.resistivity[0]![1]).toBeCloseTo(73 * Math.exp(1.959964 * 0.03), 4);
    expect(fit.misfitProbability).toBeNull();
    expect(fit.warnings).toEqual([]);
  });

  it('answers with fewer readings than unknowns, and says that the answer is one of many', () => {
    const fit = fitLayered(one, layered(3));
    expect(fit.predicted[0]).toBeCloseTo(73, 6);
    expect(fit.warnings[0]).toBe(
      '1 reading does not determine 5 unknowns: this is one of endlessly many models that fit.',
    );
    expect(fit.intervals.thickness).toEqual([
      [null, null],
      [null, null],
    ]);
  });

  it('warns of a misfit that no number of unknowns excuses, though its chance cannot be told', () => {
    const three = sounding(H_TYPE, WENNER.slice(0, 3)).map((reading, i) => ({
      ...reading,
      apparentResistivity: [10, 1000, 10][i]!,
    }));
    const fit = fitLayered(three, layered(2));
    expect(fit.misfitProbability).toBeNull();
    expect(fit.warnings[0]).toMatch(
      /^The misfit is larger than the stated errors explain \(χ²\/N \d+\), though 3 readings for 3 unknowns/,
    );
    expect(fitLayered(one, layered(1)).warnings).toEqual([]);
  });

  it('tries only the layer counts that the readings can carry', () => {
    expect(fitLayered(one, layered('auto')).layerCounts!.map((c) => c.layers)).toEqual([1]);
    const five = sounding(H_TYPE, WENNER.slice(0, 5));
    expect(fitLayered(five, layered('auto')).layerCounts!.map((c) => c.layers)).toEqual([1, 2, 3]);
  });
});

describe('fitLayered with layers "auto"', () => {
  it('fits 1 to 8 layers and chooses the fewest within the noise', () => {
    const spreads = Array.from({ length: 20 }, (_, i): Spread => ({
      type: 'schlumberger',
      halfAB: 1.4 ** i,
      halfMN: 0.2,
    }));
    const readings = sounding(H_TYPE, spreads, 0.03);
    const fit = fitLayered(readings, layered('auto'));
    const counts = fit.layerCounts!;
    expect(counts.map((c) => c.layers)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
    expect(counts.map((c) => c.chosen)).toEqual([false, false, true, false, false, false, false, false]);
    expect(counts.slice(0, 3).map((c) => c.withinNoise)).toEqual([false, false, true]);
    expect(fit.earth).toEqual(counts[2]!.earth);
    counts.slice(1).forEach((count, i) => {
      expect(count.chi2PerReading).toBeLessThanOrEqual(counts[i]!.chi2PerReading * 1.001);
    });
  });

  it('fits no count worse than the one below, however little is tried for it', () => {
    const rises = ['211-6', '211-8'].flatMap((id) => {
      const readings = readingsOf(inversionCases().find((one) => one.id === id)!);
      const counts = fitLayered(readings, layered('auto')).layerCounts!;
      // the chosen one is moderated
      return counts.filter(
        (count, i) => i > 0 && !counts[i - 1]!.chosen && count.chi2PerReading > counts[i - 1]!.chi2PerReading,
      );
    });
    expect(rises).toEqual([]);
  });

  it('gives the chosen count the same bits as a fit that asks for it', () => {
    const readings = sounding(H_TYPE, WENNER, 0.03);
    const auto = fitLayered(readings, layered('auto'));
    const asked = fitLayered(readings, layered(auto.earth.resistivity.length));
    expect(asked.earth).toEqual(auto.earth);
    expect(asked.intervals).toEqual(auto.intervals);
  });
});

describe('fitLayered refuses', () => {
  const readings = sounding(H_TYPE, WENNER);
  const cases: [string, readonly Reading[], FitSettings, object][] = [
    ['no readings', [], layered(1), { code: 'no-readings', path: ['readings'] }],
    ['nine layers', readings, layered(9), { code: 'layer-count', path: ['settings', 'layers'] }],
    [
      'a reading of zero',
      readings.with(2, { ...readings[2]!, apparentResistivity: 0 }),
      layered(1),
      { code: 'reading-value', path: ['readings', 2, 'apparentResistivity'] },
    ],
    [
      'an error of zero',
      readings.with(1, { ...readings[1]!, relativeError: 0 }),
      layered(1),
      { code: 'reading-value', path: ['readings', 1, 'relativeError'] },
    ],
    [
      'a spread that cannot be',
      readings.with(4, { ...readings[4]!, spread: { type: 'wenner', spacing: -1 } }),
      layered(1),
      { code: 'spread-length', path: ['readings', 4, 'spread', 'spacing'] },
    ],
    [
      'bounds the wrong way round',
      readings,
      layered(1, { bounds: { resistivity: [10, 1], thickness: [1, 2] } }),
      { code: 'bounds', path: ['settings', 'bounds', 'resistivity'] },
    ],
    [
      'a fixed layer that is not there',
      readings,
      layered(2, { fixed: [{ on: 'thickness', index: 1, value: 5 }] }),
      { code: 'fixed-parameter', path: ['settings', 'fixed', 0, 'index'] },
    ],
    [
      'a fixed value outside the bounds',
      readings,
      layered(2, { fixed: [{ on: 'resistivity', index: 1, value: 1e6 }] }),
      { code: 'fixed-parameter', path: ['settings', 'fixed', 0, 'value'] },
    ],
    [
      'a value that is fixed twice',
      readings,
      layered(2, {
        fixed: [
          { on: 'resistivity', index: 1, value: 10 },
          { on: 'thickness', index: 0, value: 10 },
          { on: 'resistivity', index: 1, value: 20 },
        ],
      }),
      { code: 'fixed-parameter', path: ['settings', 'fixed', 2] },
    ],
    [
      'a thickness fixed where there is one layer',
      readings,
      layered(1, { fixed: [{ on: 'thickness', index: 0, value: 5 }] }),
      { code: 'fixed-parameter', message: expect.stringContaining('one layer has no thickness') },
    ],
    [
      'a fixed value without a count',
      readings,
      layered('auto', { fixed: [{ on: 'resistivity', index: 0, value: 10 }] }),
      { code: 'fixed-parameter' },
    ],
    [
      'a start of another count',
      readings,
      layered(2, { start: H_TYPE }),
      { code: 'earth-shape', path: ['settings', 'start', 'resistivity'] },
    ],
    [
      'a start that is no earth',
      readings,
      layered('auto', { start: { resistivity: [10, 20], thickness: [] } }),
      { code: 'earth-shape', path: ['settings', 'start', 'thickness'] },
    ],
    [
      'a start below zero',
      readings,
      layered(2, { start: { resistivity: [10, -20], thickness: [3] } }),
      { code: 'earth-value', path: ['settings', 'start', 'resistivity', 1] },
    ],
  ];
  it.each(cases)('%s', (_, given, settings, fault) => {
    expect(() => fitLayered(given, settings)).toThrow(InversionError);
    expect(() => fitLayered(given, settings)).toThrow(expect.objectContaining(fault));
  });
});
