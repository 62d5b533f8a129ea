import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  describeDoubt,
  fitLayered,
  type FitResult,
  type FitSettings,
  type Interval,
  type LayeredEarth,
} from '../../../inversion';
import { layered } from '../support/fit-settings';

const SPREADS = Array.from(
  { length: 16 },
  (_, i) => ({ type: 'schlumberger', halfAB: 1.5 ** i, halfMN: 0.2 }) as const,
);

function fitOf(
  earth: LayeredEarth,
  layers: number | 'auto' = earth.resistivity.length,
  more: Partial<FitSettings> = {},
): FitResult {
  const predicted = createForwardOperator(SPREADS).predict(earth);
  const readings = SPREADS.map((spread, i) => ({
    spread,
    apparentResistivity: predicted[i]!,
    relativeError: 0.03,
  }));
  return fitLayered(readings, layered(layers, typeof layers === 'number' ? { start: earth, ...more } : more));
}

const allSettled = (layers: number): FitResult['factors'] => {
  const of = (count: number) => Array.from({ length: count }, () => 1.1);
  return { resistivity: of(layers), thickness: of(layers - 1), depth: of(layers - 1) };
};

/** The sentence as it reads; what no line break may part is tested once. */
const plain = (text: string): string => text.replaceAll('\u00a0', ' ');

describe('describeDoubt', () => {
  it('names first what was held, and calls it nothing else', () => {
    const earth = { resistivity: [100, 5, 500], thickness: [10, 1.5] };
    const doubts = (fixed: FitSettings['fixed']) => describeDoubt(fitOf(earth, 3, { fixed }));
    const [thickness, ...others] = doubts([{ on: 'thickness', index: 1, value: 1.5 }]);
    expect(thickness).toMatchObject({ kind: 'held', bed: 1, value: 1.5, unit: 'm', factor: 1 });
    expect(plain(thickness!.text)).toBe(
      'The thickness of bed 2 is held at 1.50 m; the ranges of the others hold only if that is so.',
    );
    expect(others.map(({ text }) => text).join(' ')).not.toContain('thickness of bed 2');
    const all = doubts([
      { on: 'resistivity', index: 0, value: 100 },
      { on: 'thickness', index: 0, value: 10 },
      { on: 'thickness', index: 1, value: 1.5 },
    ]);
    expect(plain(all[0]!.text)).toBe(
      'The resistivity of bed 1 is held at 100 Ω·m, the thickness of bed 1 at 10.0 m and the thickness of bed 2 at 1.50 m; ' +
        'the ranges of the others hold only if that is so.',
    );
    expect(doubts([]).some(({ kind }) => kind === 'held')).toBe(false);
  });

  it('says that a thin conductive bed is known by its conductance', () => {
    const fit = fitOf({ resistivity: [100, 5, 500], thickness: [10, 1.5] });
    const item = describeDoubt(fit).find((doubt) => doubt.kind === 'conductance')!;
    expect(item).toMatchObject({ bed: 1, unit: 'S' });
    expect(item.value).toBeCloseTo(0.3, 2);
    expect(plain(item.text)).toContain('Bed 2 is better known by S = h/ρ = 0.300 S');
    expect(item.text).toContain('S\u00a0=\u00a0h/ρ\u00a0=\u00a00.300\u00a0S');
    expect(item.factor!).toBeGreaterThan(1);
    expect(item.factor!).toBeLessThan(fit.factors.thickness[1] ?? Infinity);
  });

  it('says that a thin resistive bed is known by its transverse resistance', () => {
    const fit = fitOf({ resistivity: [50, 1500, 20], thickness: [10, 1.5] });
    const item = describeDoubt(fit).find((doubt) => doubt.kind === 'resistance')!;
    expect(item).toMatchObject({ bed: 1, unit: 'Ω·m²' });
    expect(item.value! / 2250).toBeCloseTo(1, 1);
    expect(plain(item.text)).toContain('Bed 2 is better known by T = hρ');
  });

  it('takes S from a positive correlation, T from a negative one, and neither below 0.95', () => {
    const fit = fitOf({ resistivity: [100, 5, 500], thickness: [10, 1.5] });
    const kinds = (value: number) => {
      const correlation = fit.correlation.map((row, a) =>
        row.map((cell, b) => ((a === 1 && b === 4) || (a === 4 && b === 1) ? value : cell)),
      );
      return describeDoubt({ ...fit, correlation }).flatMap((item) => (item.bed === 1 ? [item.kind] : []));
    };
    expect(kinds(0.96)).toContain('conductance');
    expect(kinds(-0.96)).toContain('resistance');
    expect(kinds(0.94)).not.toContain('conductance');
    expect(kinds(-0.94)).not.toContain('resistance');
  });

  it('calls S known only where its own factor is below 2, and gives that factor', () => {
    const fit = fitOf({ resistivity: [100, 5, 500], thickness: [10, 1.5] });
    const words = (factor: number | null) =>
      describeDoubt({ ...fit, darZarrouk: { ...fit.darZarrouk, conductanceFactor: [1.1, factor] } })
        .find((item) => item.kind === 'conductance')!
        .text.replaceAll('\u00a0', ' ');
    expect(words(1.041)).toContain(
      'is better known by S = h/ρ = 0.300 S ×÷ 1.04 (68 %) than by its thickness',
    );
    expect(words(1.7)).toContain('is better known by S = h/ρ = 0.300 S ×÷ 1.70 (68 %)');
    for (const factor of [2, null])
      expect(words(factor)).toContain(
        'Neither the thickness nor the resistivity of bed 2 is determined, nor S = h/ρ: ' +
          '0.300 S is one of many values that fit. By themselves (95 %): a thickness of ',
      );
  });

  it('says nothing of a bed whose values are both settled, however tied they are', () => {
    const fit = fitOf({ resistivity: [100, 5, 500], thickness: [10, 1.5] });
    expect(describeDoubt({ ...fit, factors: allSettled(3) })).toEqual([]);
  });

  it('names a middle bed that fewer beds explain away', () => {
    // check-values of suppression: 2 m of 31.6 Ω·m between 10 and 100 Ω·m under 10 m change two layers by 0.05 % alone
    const fit = fitOf({ resistivity: [10, 31.6, 100], thickness: [10, 2] });
    expect(fit.oneFewer).toMatchObject({ layers: 2, withinNoise: true });
    const item = describeDoubt(fit).find((doubt) => doubt.kind === 'suppression')!;
    expect(item).toMatchObject({ bed: 1, unit: 'm' });
    expect(plain(item.text)).toContain('2 beds already explain the readings within their errors (χ²/N ');
    const needed = { ...fit, oneFewer: { ...fit.oneFewer!, withinNoise: false }, factors: allSettled(3) };
    expect(describeDoubt(needed).filter((doubt) => doubt.kind === 'suppression')).toEqual([]);
  });

  it('has nothing to say of a ground that the readings settle', () => {
    expect(describeDoubt(fitOf({ resistivity: [100, 20], thickness: [8] }))).toEqual([]);
  });

  it('names values that are not determined', () => {
    const fit = fitOf({ resistivity: [100, 20], thickness: [8] });
    const factors = { ...fit.factors, resistivity: [fit.factors.resistivity[0]!, null] };
    expect(describeDoubt({ ...fit, factors })).toEqual([
      expect.objectContaining({ bed: 1, kind: 'resistivity', unit: 'Ω·m', factor: null }),
    ]);
    const wide = { ...fit.factors, resistivity: [fit.factors.resistivity[0]!, 2.7] };
    const resistivity: Interval[] = [fit.intervals.resistivity[0]!, [3, 140]];
    const intervals = { ...fit.intervals, resistivity };
    expect(plain(describeDoubt({ ...fit, factors: wide, intervals })[0]!.text)).toBe(
      'The resistivity of bed 2 is not determined: 3.00 to 140 Ω·m fit (95 %).',
    );
    const poor = { ...fit.factors, resistivity: [fit.factors.resistivity[0]!, 1.6] };
    expect(plain(describeDoubt({ ...fit, factors: poor, intervals })[0]!.text)).toBe(
      'The resistivity of bed 2 is poorly determined: 3.00 to 140 Ω·m fit (95 %).',
    );
    const fair = { ...fit.factors, resistivity: [fit.factors.resistivity[0]!, 1.4] };
    expect(describeDoubt({ ...fit, factors: fair, intervals })).toEqual([]);
  });
});
