import { describe, expect, it } from 'vitest';
import {
  compareFits,
  createForwardOperator,
  describeDoubt,
  fitEarth,
  type FitSettings,
  type LayeredEarth,
} from '../../../inversion';
import { layered } from '../support/fit-settings';

const SPREADS = Array.from({ length: 14 }, (_, i) => ({ type: 'wenner', spacing: 1.5 ** i }) as const);

function fitOf(earth: LayeredEarth, layers = earth.resistivity.length, more: Partial<FitSettings> = {}) {
  const predicted = createForwardOperator(SPREADS).predict(earth);
  const readings = SPREADS.map((spread, i) => ({
    spread,
    // an even scatter of 1 %, so that every fit has a misfit to speak of
    apparentResistivity: predicted[i]! * (i % 2 === 0 ? 1.01 : 0.99),
    relativeError: 0.03,
  }));
  return fitEarth(readings, { ...layered(layers), ...more });
}

const BASE = fitOf({ resistivity: [100, 20], thickness: [5] });

const plain = (text: string): string => text.replaceAll('\u00a0', ' ');

describe('compareFits', () => {
  it('finds the bed that differs beyond the intervals, and only that', () => {
    const { pairs } = compareFits([BASE, fitOf({ resistivity: [100, 30], thickness: [5] })]);
    const supported = pairs[0]!.beds.filter((bed) => bed.intervalsOverlap === false);
    expect(supported.map((bed) => [bed.bed, bed.quantity])).toEqual([[1, 'resistivity']]);
    expect(supported[0]!.ratio).toBeCloseTo(1.5, 3);
    expect(plain(pairs[0]!.text)).toContain(
      'One value differs beyond the 95 % intervals: resistivity of bed 2 (20.0 against 30.0 Ω·m). They fit alike',
    );
  });

  it('says that the same readings do not choose between models that differ and fit alike', () => {
    const [pair] = compareFits([BASE, fitOf({ resistivity: [100, 30], thickness: [5] })]).pairs;
    expect(plain(pair!.text)).toContain('the same readings do not choose between them.');
  });

  it('says when the readings speak against a held value', () => {
    const held = (value: number) =>
      fitOf({ resistivity: [100, 20], thickness: [5] }, 2, {
        fixed: [{ on: 'resistivity', index: 1, value }],
      });
    const textOf = (value: number) => plain(compareFits([BASE, held(value)]).pairs[0]!.text);
    expect(textOf(20.1)).not.toContain('speak against');
    expect(textOf(25)).toMatch(
      /The readings speak against the value that the second holds: χ² rises by [\d.]+ for it \(chance (less than 0\.01|[\d.]+) %\)\./,
    );
  });

  it('says which values a run holds, and reads nothing out of their ranges', () => {
    const held = fitOf({ resistivity: [100, 20], thickness: [5] }, 2, {
      fixed: [{ on: 'thickness', index: 0, value: 7 }],
    });
    const [pair] = compareFits([BASE, held], ['Run A', 'Run B']).pairs;
    expect(plain(pair!.text)).toContain(
      'Run B holds the thickness of bed 1 at 7.00 m, which the readings did not find. Other ranges of that model hold only if that is so.',
    );
    expect(plain(pair!.text)).toContain('thickness of bed 1 (5.00 against 7.00 m, held)');
    const isHeld = pair!.beds.flatMap((bed) => (bed.isHeld ? [`${bed.quantity} ${bed.bed}`] : []));
    expect(isHeld).toEqual(['thickness 0', 'depth 0']);
    const both = compareFits([held, held]).pairs[0]!;
    expect(plain(both.text)).toContain('not find; the second holds the thickness of bed 1 at 7.00 m');
    expect(both.text).toContain('Other ranges of both');
    expect(compareFits([BASE, BASE]).pairs[0]!.text).not.toContain('holds');
  });

  it('sets no bed against the cells of a smooth ground, and says nothing of its beds', () => {
    const smooth = fitOf({ resistivity: [100, 20], thickness: [5] }, 2, { kind: 'smooth', layers: 'auto' });
    const [pair] = compareFits([BASE, smooth], ['Run A', 'Run B']).pairs;
    expect(pair!.beds).toEqual([]);
    expect(pair!.totalConductanceRatio).toBeNull();
    expect(pair!.text).toMatch(
      /^Run A has 2 beds, Run B has \d+ cells of a fixed grid: they are not compared bed by bed\. /,
    );
    expect(describeDoubt(smooth)).toEqual([]);
  });

  it('tells the base of bed 1 once, as its thickness', () => {
    const [pair] = compareFits([BASE, fitOf({ resistivity: [100, 20], thickness: [10] })]).pairs;
    expect(pair!.beds.filter((bed) => bed.intervalsOverlap === false).map((bed) => bed.quantity)).toEqual([
      'thickness',
      'depth',
    ]);
    expect(plain(pair!.text)).toContain(
      'One value differs beyond the 95 % intervals: thickness of bed 1 (5.00 against 10.0 m).',
    );
  });

  it('does not set a half-space against a bounded bed', () => {
    const three = fitOf({ resistivity: [100, 200, 20], thickness: [5, 20] });
    const [pair] = compareFits([BASE, three]).pairs;
    const second = pair!.beds.find((bed) => bed.bed === 1 && bed.quantity === 'resistivity')!;
    expect(second.intervalsOverlap).toBe(false);
    expect(pair!.text).not.toContain('resistivity of bed 2');
  });

  it('says when both fit within the errors, and when intervals are too narrow for the misfit', () => {
    const told = (first: number | null, second: number | null) =>
      compareFits(
        [
          { ...BASE, chi2PerReading: 1, misfitProbability: first },
          { ...BASE, chi2PerReading: 0.7, misfitProbability: second },
        ],
        ['Run A', 'Run B'],
      ).pairs[0]!.text.replaceAll('\u00a0', ' ');
    expect(told(0.4, 0.8)).toContain(
      'Run B fits closer (χ²/N 1.00 and 0.700), but both fit within the errors.',
    );
    expect(told(0.03, 0.8)).toContain('Run B fits closer (χ²/N 1.00 and 0.700).');
    expect(told(null, 0.8)).toContain('Run B fits closer (χ²/N 1.00 and 0.700).');
    expect(told(0.03, 0.8)).not.toContain('too narrow');
    expect(told(0.001, 0.8)).toContain('Run A misfits beyond its errors, so its intervals are too narrow.');
    expect(told(0.8, 0.001)).toContain('Run B misfits beyond its errors');
    expect(told(0.001, 0.001)).toContain('The stated errors explain neither misfit');
  });

  it('says that the data do not tell near models apart', () => {
    const { pairs } = compareFits([BASE, fitOf({ resistivity: [101, 20.1], thickness: [5] })]);
    expect(plain(pairs[0]!.text)).toContain('the data do not tell these models apart');
  });

  it('gives the ratios of S and T and the difference of the misfits', () => {
    const worse = fitOf({ resistivity: [100, 20], thickness: [5] }, 1);
    const [pair] = compareFits([BASE, worse]).pairs;
    expect(pair).toMatchObject({ sameLayerCount: false, totalConductanceRatio: null });
    expect(pair!.chi2PerReadingDifference).toBeCloseTo(worse.chi2PerReading - BASE.chi2PerReading, 12);
    expect(plain(pair!.text)).toContain('The models have 2 and 1 beds');
    expect(plain(pair!.text)).toContain('The first fits closer');
    expect(pair!.text).not.toContain('do not tell these models apart');
    expect(compareFits([BASE, worse], ['Run C', 'Run A']).pairs[0]!.text).toContain('Run C fits closer');
    const thicker = compareFits([BASE, fitOf({ resistivity: [100, 20], thickness: [10] })]).pairs[0]!;
    expect(thicker.totalConductanceRatio).toBeCloseTo(2, 1);
    expect(thicker.totalResistanceRatio).toBeCloseTo(2, 1);
  });

  it('compares every pair of three and names the closest fit', () => {
    const worse = fitOf({ resistivity: [100, 20], thickness: [5] }, 1);
    const comparison = compareFits([worse, BASE, worse]);
    expect(comparison.pairs.map((pair) => [pair.first, pair.second])).toEqual([
      [0, 1],
      [0, 2],
      [1, 2],
    ]);
    expect(comparison.bestFitting).toBe(1);
  });

  it('takes an unbounded interval as reaching everywhere', () => {
    const open = {
      ...BASE,
      intervals: {
        ...BASE.intervals,
        resistivity: BASE.intervals.resistivity.map((): [null, null] => [null, null]),
      },
    };
    const { pairs } = compareFits([open, fitOf({ resistivity: [100, 500], thickness: [5] })]);
    const bed = pairs[0]!.beds.find((one) => one.bed === 1 && one.quantity === 'resistivity')!;
    expect(bed.intervalsOverlap).toBe(true);
  });
});
