import { describe, expect, it } from 'vitest';
import { createForwardOperator, ensembleRange, InversionError, sampleEnsemble } from '../../../../inversion';
import { drawPosterior } from '../../../../inversion/uncertainty/ensemble/draw-posterior';
import { statedCountSpace, unknownCountSpace } from '../../../../inversion/uncertainty/ensemble/ground-space';
import type { Model } from '../../../../inversion/uncertainty/ensemble/metropolis';
import { posteriorCases } from '../../support/posterior-cases';

const CASES = posteriorCases();
const PRIOR = { resistivity: [1, 1e4], thickness: [0.2, 200] } as const;
const settings = { layers: 3, prior: PRIOR, draws: 20_000, seed: 1 } as const;

describe('a stated number of layers', () => {
  it.each([0, 1, 2])('meets the quantiles of independent population runs, case %i', (c) => {
    const { readings, quantiles_log10: expected, layers, prior } = CASES[c]!;
    const found = sampleEnsemble(readings, { ...settings, layers, prior });
    expect(found.status).toBe('finished');
    expect(found.rHat).toBeLessThan(1.01);
    for (const [name, value] of Object.entries(expected)) {
      const index = Number(name.slice(-1)) - 1;
      const { [name.startsWith('rho') ? 'resistivity' : 'thickness']: all } = found.quantiles!;
      for (const p of ['p5', 'p50', 'p95'] as const) {
        const allowed = 0.05 * (value.p95 - value.p5) + 3 * value.mc_error[p];
        expect(Math.abs(Math.log10(all[index]![p]) - value[p]), `${name} ${p}`).toBeLessThan(allowed);
      }
    }
  });

  it('shows both ends of a middle layer that is thin and resistive or thick and moderate', () => {
    const { earths } = sampleEnsemble(CASES[1]!.readings, { ...settings, seed: 4 });
    const ends = ensembleRange(earths, ({ thickness }) => thickness[1]!)!;
    expect(ends.p5).toBeLessThan(0.5);
    expect(ends.p95).toBeGreaterThan(8);
    const product = ensembleRange(earths, ({ resistivity, thickness }) => resistivity[1]! * thickness[1]!)!;
    expect(product.p95 / product.p5).toBeLessThan(2);
  });

  it('gives the same bits again, others for another seed, and leaves its input alone', () => {
    const frozen = Object.freeze(CASES[0]!.readings.map((reading) => Object.freeze(reading)));
    const run = (seed: number) => JSON.stringify(sampleEnsemble(frozen, { ...settings, draws: 400, seed }));
    expect(run(3)).toBe(run(3));
    expect(run(3)).not.toBe(run(4));
  });

  it('says that too few samples are too few', () => {
    const found = sampleEnsemble(CASES[0]!.readings, { ...settings, draws: 100 });
    expect(found.status).toBe('chain-too-short');
    expect(found.message).toContain('too short');
  });

  it('narrows what is known beforehand', () => {
    const priors = [{ on: 'depth', index: 1, value: 12, sigma: 0.2 }] as const;
    const free = sampleEnsemble(CASES[0]!.readings, { ...settings, draws: 4000 }).quantiles!;
    const told = sampleEnsemble(CASES[0]!.readings, { ...settings, draws: 4000, priors }).quantiles!;
    expect(told.depth[1]!.p95 - told.depth[1]!.p5).toBeLessThan(0.7);
    expect(free.depth[1]!.p95 - free.depth[1]!.p5).toBeGreaterThan(2);
  });

  it('stops when it is asked to, and tells where it stands', () => {
    const shares: number[] = [];
    const run = () =>
      sampleEnsemble(CASES[0]!.readings, settings, {
        onProgress: ({ share }) => shares.push(share),
        shouldStop: () => shares.length >= 3,
      });
    expect(run).toThrow(InversionError);
    expect(shares).toHaveLength(3);
  });
});

describe('without readings the prior comes back', () => {
  const flat = (space: Model['space']) =>
    drawPosterior({ space, logLikelihood: () => 0 }, { draws: 8000, seed: 2, report: () => undefined });

  it('with every count as likely', () => {
    const { chains } = flat(unknownCountSpace(PRIOR));
    const counts = Array.from({ length: 8 }, () => 0);
    for (const { layers } of chains) for (const count of layers) counts[count - 1]! += 1 / 8000;
    counts.forEach((share) => expect(Math.abs(share - 0.125)).toBeLessThan(0.03));
  });

  it('with every coordinate even over its range', () => {
    const { chains } = flat(statedCountSpace(PRIOR, 3));
    for (let j = 0; j < 5; j++) {
      const [low, high] = (j < 3 ? PRIOR.resistivity : PRIOR.thickness).map(Math.log);
      const places = chains.flatMap(({ values, size }) =>
        Array.from({ length: size }, (_, i) => (values[i * 5 + j]! - low!) / (high! - low!)),
      );
      for (let tenth = 1; tenth < 10; tenth++) {
        const below = places.filter((place) => place < tenth / 10).length / places.length;
        expect(Math.abs(below - tenth / 10)).toBeLessThan(0.03);
      }
    }
  });
});

describe('an unknown number of layers', () => {
  it('finds the counts, depths and boundaries of a clear ground', () => {
    const spreads = Array.from({ length: 12 }, (_, i) => ({ type: 'wenner', spacing: 1.5 ** i }) as const);
    const clean = createForwardOperator(spreads).predict({ resistivity: [100, 10], thickness: [5] });
    const readings = spreads.map((spread, i) => ({
      spread,
      apparentResistivity: clean[i]!,
      relativeError: 0.05,
    }));
    const found = sampleEnsemble(readings, { ...settings, layers: 'unknown', draws: 4000 });
    expect(found.quantiles).toBeNull();
    expect(found.layerCountProbability![0]).toBeLessThan(1e-3);
    expect(found.layerCountProbability!.indexOf(Math.max(...found.layerCountProbability!))).toBe(1);
    expect(found.layerCountProbability!.reduce((sum, chance) => sum + chance, 0)).toBeCloseTo(1, 9);
    const near = found.depths.findIndex((depth) => depth > 5);
    const peak = found.interfaceDensity.indexOf(Math.max(...found.interfaceDensity));
    expect(Math.abs(peak - near)).toBeLessThan(4);
    const shallow = found.resistivityAtDepth[found.depths.findIndex((depth) => depth > 1)]!;
    expect(shallow.p50).toBeGreaterThan(85);
    expect(shallow.p50).toBeLessThan(115);
    found.density.share.forEach((row) =>
      expect(row.reduce((sum, chance) => sum + chance, 0)).toBeCloseTo(1, 9),
    );
  });
});

describe('the target question', () => {
  it('answers under three priors, with the chance before the readings, in words', () => {
    const target = { resistivity: [5, 40], minThickness: 5, topAbove: 10 } as const;
    const { target: answer } = sampleEnsemble(CASES[0]!.readings, { ...settings, draws: 4000, target });
    expect(answer!.probability).toBeGreaterThan(0.8);
    expect(answer!.standardError).toBeGreaterThan(0);
    expect(answer!.before).toBeGreaterThan(0.1);
    expect(answer!.before).toBeLessThan(0.6);
    expect(answer!.wide.prior.resistivity).toEqual([0.1, 1e5]);
    expect(answer!.words).toContain(answer!.priorDecides ? 'The prior decides' : 'hardly hangs on the prior');
  });
});

it.each([
  [{ prior: { ...PRIOR, resistivity: [5, 1] } }, 'bounds', ['settings', 'prior', 'resistivity']],
  [{ draws: 0 }, 'sample-draws', ['settings', 'draws']],
  [{ layers: 9 }, 'layer-count', ['settings', 'layers']],
  [
    { target: { resistivity: [1, 2], minThickness: -1, topAbove: 3 } },
    'target-bed',
    ['settings', 'target', 'minThickness'],
  ],
] as const)('refuses %j', (wrong, code, path) => {
  const run = () => sampleEnsemble(CASES[0]!.readings, { ...settings, ...(wrong as object) });
  expect(run).toThrow(expect.objectContaining({ code, path }));
});
