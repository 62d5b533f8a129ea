import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  fitLayered,
  fitLine,
  type FitResult,
  type ForwardOperator,
  type InversionError,
  type LayeredEarth,
  type LineSettings,
  type LineSounding,
} from '../../../inversion';
import { layered } from '../support/fit-settings';
import { alongLine, everyMetres, inventedLine } from './invented-line';

/** Cover and moist bed over rock whose top dips from 11 m to 25 m over 1100 m. */
const dipping = (x: number): LayeredEarth => ({
  resistivity: [80, 25, 400],
  thickness: [3, 8 + (14 * x) / 1100],
});
const depths = ({ earth }: FitResult): number[] => {
  let depth = 0;
  return earth.thickness.map((h) => (depth += h));
};

describe('a dipping boundary', () => {
  const places = everyMetres(100, 12);
  const line = inventedLine(places, dipping);
  const result = fitLine(line, alongLine(3));

  it('is recovered along the line, within the noise and its intervals', () => {
    expect(result.status).toMatch(/^converged/);
    expect(result.chi2PerReading).toBeLessThan(1.2);
    expect(result.misfitProbability).toBeGreaterThan(0.05);
    let covered = 0;
    result.soundings.forEach((one, i) => {
      const truth = 3 + dipping(places[i]!).thickness[1]!;
      expect(Math.abs(Math.log(depths(one)[1]! / truth))).toBeLessThan(0.2);
      const [low, high] = one.intervals.depth[1]!;
      if (low! <= truth && truth <= high!) covered += 1;
    });
    expect(covered).toBeGreaterThanOrEqual(10);
  });

  it('settles fewer parameters than a fit of each sounding has, and more than one ground', () => {
    expect(result.effectiveParameters).toBeGreaterThan(5);
    expect(result.effectiveParameters).toBeLessThan(12 * 5 - 1);
  });

  it('is the same in any order of the soundings, and for another line begun at the other end', () => {
    const shuffled = [7, 0, 11, 3, 5, 1, 10, 2, 9, 4, 8, 6];
    const again = fitLine(
      shuffled.map((i) => line[i]!),
      alongLine(3),
    );
    shuffled.forEach((i, k) => expect(again.soundings[k]!.earth).toEqual(result.soundings[i]!.earth));
    const mirrored = fitLine(
      line.map((sounding) => ({ ...sounding, x: -sounding.x })),
      alongLine(3),
    );
    mirrored.soundings.forEach((one, i) =>
      one.earth.resistivity.forEach((rho, k) =>
        expect(Math.abs(Math.log(rho / result.soundings[i]!.earth.resistivity[k]!))).toBeLessThan(0.01),
      ),
    );
  });

  it('gives the same bits again and leaves its input alone', () => {
    const copy = structuredClone(line);
    expect(fitLine(line, alongLine(3))).toEqual(result);
    expect(line).toEqual(copy);
  });

  it('is better known than where the ties are loose', () => {
    const loose = fitLine(line, alongLine(3, { lateral: { resistivity: 2, depth: 2 } }));
    result.soundings.forEach((one, i) =>
      expect(one.factors.depth[1]!).toBeLessThan(loose.soundings[i]!.factors.depth[1]!),
    );
  });

  it('comes to the fits of each sounding alone where the ties are loose', () => {
    const loose = fitLine(line, alongLine(3, { lateral: { resistivity: 100, depth: 100 } }));
    line.forEach(({ readings }, i) => {
      const alone = fitLayered(readings, layered(3));
      expect(loose.soundings[i]!.chi2PerReading).toBeCloseTo(alone.chi2PerReading, 3);
    });
  });
});

/** A thin resistive bed: known alone by h × ρ, so that fits by themselves scatter along its equivalence. */
const thinBed = (): LayeredEarth => ({ resistivity: [50, 400, 10], thickness: [5, 4] });
const scatter = (logs: number[]): number => {
  const mean = logs.reduce((sum, value) => sum + value, 0) / logs.length;
  return Math.sqrt(logs.reduce((sum, value) => sum + (value - mean) ** 2, 0) / logs.length);
};

describe('an equivalent bed', () => {
  const line = inventedLine(everyMetres(50, 12), thinBed, { seed: 3 });
  const tied = fitLine(line, alongLine(3));

  it('scatters less along the line than in fits of each sounding alone', () => {
    const alone = line.map(({ readings }) => fitLayered(readings, layered(3)));
    const ofRho = (results: readonly FitResult[]) =>
      scatter(results.map(({ earth }) => Math.log(earth.resistivity[1]!)));
    expect(ofRho(tied.soundings)).toBeLessThan(ofRho(alone) / 3);
  });

  it('is narrowed by a borehole at its place, and less with distance', () => {
    const contacts = [
      { boundary: 0, depth: 5, sigma: 0.2 },
      { boundary: 1, depth: 9, sigma: 0.2 },
    ];
    const bored = fitLine(line, alongLine(3, { boreholes: [{ x: 0, contacts }] }));
    const gain = (i: number) =>
      Math.log(tied.soundings[i]!.factors.depth[1]!) / Math.log(bored.soundings[i]!.factors.depth[1]!);
    expect(Math.abs(depths(bored.soundings[0]!)[1]! - 9)).toBeLessThan(0.6);
    expect(gain(0)).toBeGreaterThan(2);
    expect(gain(0)).toBeGreaterThan(gain(2));
    expect(gain(2)).toBeGreaterThan(gain(6));
    expect(gain(11)).toBeGreaterThanOrEqual(1);
    expect(bored.warnings).toEqual([]);
  });

  it('says where a borehole and the readings contradict each other', () => {
    const contacts = [{ boundary: 1, depth: 60, sigma: 0.1 }];
    const tight = { resistivity: 0.05, depth: 0.05 };
    const { warnings } = fitLine(line, alongLine(3, { lateral: tight, boreholes: [{ x: 275, contacts }] }));
    expect(warnings.join()).toContain('The borehole at x = 275 m met the base of bed 2 at 60.0 ± 0.100 m');
  });
});

it('draws a sounding out of a wrong valley that its own readings leave open', () => {
  const ground = (): LayeredEarth => ({ resistivity: [100, 20, 300], thickness: [4, 12] });
  const line = inventedLine(everyMetres(100, 9), ground, { seed: 5 });
  // three readings alone fit very many grounds
  const poor = line.map((sounding, i) =>
    i === 4 ? { ...sounding, readings: sounding.readings.filter((_, r) => r % 5 === 0) } : sounding,
  );
  const { soundings } = fitLine(poor, alongLine(3));
  const [rho, h] = [soundings[4]!.earth.resistivity, soundings[4]!.earth.thickness];
  [...rho, ...h].forEach((value, j) =>
    expect(Math.abs(Math.log(value / [100, 20, 300, 4, 12][j]!))).toBeLessThan(0.3),
  );
});

describe('the number of layers', () => {
  it('is the fewest with which the whole line is within the noise', () => {
    const line = inventedLine(everyMetres(100, 6), dipping);
    const { layers, layerCounts, soundings } = fitLine(line, alongLine('auto'));
    expect(layers).toBe(3);
    expect(layerCounts!.map((count) => [count.layers, count.withinNoise, count.chosen])).toEqual([
      [1, false, false],
      [2, false, false],
      [3, true, true],
    ]);
    soundings.forEach((one) => {
      expect(one.earth.resistivity).toHaveLength(3);
      expect(one.layerCounts!.find((count) => count.chosen)!.layers).toBe(3);
    });
  });

  it('is at least what the boreholes met', () => {
    const line = inventedLine(everyMetres(100, 4), () => ({ resistivity: [100], thickness: [] }));
    const boreholes = [{ x: 50, contacts: [{ boundary: 1, depth: 10, sigma: 1 }] }];
    expect(fitLine(line, alongLine('auto')).layers).toBe(1);
    expect(fitLine(line, alongLine('auto', { boreholes })).layers).toBe(3);
  });
});

it('shifts branches, holds fixed values and tolerates an outlier at each sounding', () => {
  const line = inventedLine(everyMetres(100, 5), dipping).map(({ x, readings }) => ({
    x,
    readings: readings.map((reading, i) => ({
      ...reading,
      branch: i < 7 ? 'a' : 'b',
      apparentResistivity: reading.apparentResistivity * (i < 7 ? 1 : 1.15) * (i === 3 ? 1.6 : 1),
    })),
  }));
  const { soundings } = fitLine(
    line,
    alongLine(3, {
      branchShiftSigma: 0.1,
      outlierTolerant: true,
      fixed: [{ on: 'resistivity', index: 0, value: 80 }],
    }),
  );
  soundings.forEach((one) => {
    expect(one.earth.resistivity[0]).toBe(80);
    expect(one.intervals.resistivity[0]).toEqual([80, 80]);
    expect(one.downWeighted.map(({ index }) => index)).toContain(3);
    expect(one.shifts.map(({ branch, held }) => [branch, held])).toEqual([
      ['a', true],
      ['b', false],
    ]);
    expect(one.shifts[1]!.factor).toBeGreaterThan(1.03);
  });
});

it('calls a bed that no reading of the line tells not determined', () => {
  const even = inventedLine(everyMetres(100, 4), dipping).map(({ x, readings }) => ({
    x,
    readings: readings.map((reading) => ({ ...reading, apparentResistivity: 100 })),
  }));
  const { soundings } = fitLine(even, alongLine(3));
  soundings.forEach((one) => {
    expect(one.intervals.depth).toEqual([
      [null, null],
      [null, null],
    ]);
    expect(one.factors.depth).toEqual([null, null]);
  });
});

it('takes one sounding, and two at one place with a word about them', () => {
  const [sounding] = inventedLine([0], dipping);
  const single = fitLine([sounding!], alongLine(3));
  expect(single.soundings[0]!.chi2PerReading).toBeCloseTo(
    fitLayered(sounding!.readings, layered(3)).chi2PerReading,
    4,
  );
  const crossed = fitLine(inventedLine([40, 40], dipping), alongLine(3));
  expect(crossed.warnings.join()).toContain('Soundings share the place x = 40 m');
});

/** Forward runs that a fit asks of its operator. */
function forwardRuns(count: number): number {
  let runs = 0;
  const counted = (operator: ForwardOperator): ForwardOperator => ({
    ...operator,
    predictInto: (...given) => {
      runs += 1;
      operator.predictInto(...given);
    },
    slopeRows: (...given) => {
      runs += 1;
      return operator.slopeRows(...given);
    },
  });
  const ground = (x: number): LayeredEarth => ({
    resistivity: [80, 25, 400],
    thickness: [3, 12 + 4 * Math.sin(x / 500)],
  });
  const line = inventedLine(everyMetres(100, count), ground);
  const operator = counted(createForwardOperator(line[0]!.readings.map(({ spread }) => spread)));
  fitLine(line, alongLine(3), { operators: { operatorFor: () => operator } });
  return runs;
}

it('does work linear in the number of soundings', () => {
  const [few, many] = [forwardRuns(25), forwardRuns(100)];
  expect(many / few).toBeLessThan(4.4);
});

describe('input that cannot be used', () => {
  const [sounding] = inventedLine([0], dipping) as [LineSounding];
  const refusal = (
    soundings: readonly LineSounding[],
    settings: LineSettings,
  ): Pick<InversionError, 'code' | 'path'> => {
    try {
      fitLine(soundings, settings);
    } catch (error) {
      const { code, path } = error as InversionError;
      return { code, path };
    }
    throw new Error('was taken');
  };
  const borehole = (...contacts: [number, number, number][]) => [
    { x: 0, contacts: contacts.map(([boundary, depth, sigma]) => ({ boundary, depth, sigma })) },
  ];

  it.each<[string, LineSounding[], Partial<LineSettings>, string, (string | number)[]]>([
    ['no soundings', [], {}, 'no-readings', ['soundings']],
    ['no readings', [sounding, { x: 1, readings: [] }], {}, 'no-readings', ['soundings', 1, 'readings']],
    ['a place that is none', [{ ...sounding, x: NaN }], {}, 'line-place', ['soundings', 0, 'x']],
    [
      'a scale of zero',
      [sounding],
      { lateral: { resistivity: 0.1, depth: 0 } },
      'lateral',
      ['settings', 'lateral', 'depth'],
    ],
    [
      'a boundary that is not there',
      [sounding],
      { boreholes: borehole([2, 5, 1]) },
      'borehole',
      ['settings', 'boreholes', 0, 'contacts', 0, 'boundary'],
    ],
    [
      'a depth of zero',
      [sounding],
      { boreholes: borehole([0, 0, 1]) },
      'borehole',
      ['settings', 'boreholes', 0, 'contacts', 0, 'depth'],
    ],
    [
      'boundaries upside down',
      [sounding],
      { boreholes: borehole([0, 9, 1], [1, 5, 1]) },
      'borehole',
      ['settings', 'boreholes', 0, 'contacts', 1],
    ],
    ['too many layers', [sounding], { layers: 9 }, 'layer-count', ['settings', 'layers']],
  ])('refuses %s with its place', (_, soundings, settings, code, path) => {
    expect(refusal(soundings, alongLine(3, settings))).toEqual({ code, path });
  });
});
