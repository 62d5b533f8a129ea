import { describe, expect, it } from 'vitest';
import {
  createForwardOperator,
  createRandomStream,
  fitEarth,
  InversionError,
  type LayeredEarth,
  type Reading,
} from '../../../inversion';
import { MODERATION } from '../../../inversion/fit/moderate-model';
import { createResidualSystem } from '../../../inversion/fit/residual-system';
import { layered } from '../support/fit-settings';

const SPREADS = Array.from({ length: 18 }, (_, i) => {
  const halfAB = 1.5 * 1.4 ** i;
  return { type: 'schlumberger', halfAB, halfMN: halfAB < 15 ? 0.5 : 5 } as const;
});

function sounding(earth: LayeredEarth, noise: number, error = noise): Reading[] {
  const random = createRandomStream(5);
  return Array.from(createForwardOperator(SPREADS).predict(earth), (value, i) => ({
    spread: SPREADS[i]!,
    apparentResistivity: value * Math.exp(noise * random.normal()),
    relativeError: error,
  }));
}

/** A thin conductive bed, known by S = 0.4 S alone. */
const TIED: LayeredEarth = { resistivity: [80, 5, 600], thickness: [6, 2] };

describe('priors', () => {
  const readings = sounding(TIED, 0.03);
  const free = fitEarth(readings, layered(3));
  const width = ([low, high]: readonly (number | null)[]) => Math.log((high ?? 1e3) / (low ?? 0.02));

  it('ties a boundary to a borehole contact, in metres, and so knows the bed above it', () => {
    const contact = { on: 'depth', index: 1, value: 8, sigma: 0.3 } as const;
    const fit = fitEarth(readings, layered(3, { priors: [contact] }));
    const depth = fit.earth.thickness[0]! + fit.earth.thickness[1]!;
    expect(Math.abs(depth - 8)).toBeLessThan(0.6);
    const [low, high] = fit.intervals.depth[1]!;
    // 95 % of 8 ± 0.3 m alone is 7.4 to 8.6 m; the readings can only narrow it
    expect(low!).toBeGreaterThan(7.2);
    expect(high!).toBeLessThan(8.8);
    expect(width(fit.intervals.thickness[1]!)).toBeLessThan(0.6 * width(free.intervals.thickness[1]!));
    expect(fit.chi2PerReading).toBeGreaterThanOrEqual(free.chi2PerReading / (1 + MODERATION));
  });

  it('reports χ²/N of the readings alone, the prior apart', () => {
    const far = { on: 'depth', index: 1, value: 30, sigma: 0.3 } as const;
    const fit = fitEarth(readings, layered(3, { priors: [far] }));
    const sum = fit.residuals.reduce((total, r) => total + r * r, 0);
    expect(fit.chi2PerReading).toBeCloseTo(sum / readings.length, 12);
    expect(fit.earth.thickness[0]! + fit.earth.thickness[1]!).toBeGreaterThan(25);
  });

  it('weighs a value in ln units', () => {
    const tight = { on: 'resistivity', index: 1, value: 20, sigma: 0.01 } as const;
    const fit = fitEarth(readings, layered(3, { priors: [tight] }));
    expect(Math.abs(Math.log(fit.earth.resistivity[1]! / 20))).toBeLessThan(0.03);
    const loose = fitEarth(readings, layered(3, { priors: [{ ...tight, sigma: 100 }] }));
    expect(loose.chi2PerReading / free.chi2PerReading).toBeCloseTo(1, 2);
    const thick = { on: 'thickness', index: 0, value: 4, sigma: 0.001 } as const;
    expect(fitEarth(readings, layered(3, { priors: [thick] })).earth.thickness[0]).toBeCloseTo(4, 1);
  });

  it('refuses a prior that belongs to no value, with its path', () => {
    const refused = (prior: Parameters<typeof layered>[1], layers: number | 'auto' = 3) => {
      try {
        fitEarth(readings, layered(layers, prior));
      } catch (error) {
        if (error instanceof InversionError) return `${error.code} ${error.path.join('.')}`;
        throw error;
      }
      return 'taken';
    };
    const prior = { on: 'depth', index: 2, value: 8, sigma: 0.3 } as const;
    expect(refused({ priors: [prior] })).toBe('prior settings.priors.0.index');
    expect(refused({ priors: [{ ...prior, index: 0, sigma: 0 }] })).toBe('prior settings.priors.0.sigma');
    expect(refused({ priors: [{ ...prior, index: 0, value: NaN }] })).toBe('prior settings.priors.0.value');
    expect(refused({ priors: [{ ...prior, index: 0 }] }, 'auto')).toBe('prior settings.priors.0');
    expect(refused({ branchShiftSigma: 0 })).toBe('branch-shift settings.branchShiftSigma');
  });
});

describe('branch shifts', () => {
  const truth: LayeredEarth = { resistivity: [60, 200, 15], thickness: [3, 12] };
  const shifted = sounding(truth, 0.01).map((reading): Reading => {
    const branch = `MN/2 = ${reading.spread.type === 'schlumberger' ? reading.spread.halfMN : 0}`;
    const factor = branch === 'MN/2 = 0.5' ? 1.15 : 1;
    return { ...reading, branch, apparentResistivity: factor * reading.apparentResistivity };
  });

  it('finds the shift of the smaller branch with its range, and the ground beneath', () => {
    const plain = fitEarth(shifted, layered(3));
    const fit = fitEarth(shifted, layered(3, { branchShiftSigma: 0.1 }));
    expect(plain.chi2PerReading).toBeGreaterThan(3);
    expect(fit.chi2PerReading).toBeLessThan(1.5);
    const held = fit.shifts.find((shift) => shift.held)!;
    const free = fit.shifts.find((shift) => !shift.held)!;
    expect([held.branch, held.factor, held.readings]).toEqual(['MN/2 = 5', 1, 11]);
    expect([free.branch, free.readings]).toEqual(['MN/2 = 0.5', 7]);
    expect(free.factor).toBeCloseTo(1.15, 1);
    expect(free.interval[0]).toBeLessThan(1.15);
    expect(free.interval[1]).toBeGreaterThan(1.15);
    truth.resistivity.forEach((rho, i) => expect(fit.earth.resistivity[i]! / rho).toBeCloseTo(1, 1));
    // what is predicted is comparable with what was read
    fit.predicted.forEach((value, i) =>
      expect((Math.log(value / shifted[i]!.apparentResistivity) / 0.01 - fit.residuals[i]!) / 1).toBeCloseTo(
        0,
        9,
      ),
    );
  });

  it('shifts nothing without being asked, or where all readings are of one branch', () => {
    expect(fitEarth(shifted, layered(3)).shifts).toEqual([]);
    const alike = shifted.map((reading) => ({ ...reading, branch: 'a' }));
    expect(fitEarth(alike, layered(3, { branchShiftSigma: 0.1 })).shifts).toEqual([]);
  });
});

describe('outlier-tolerant fits', () => {
  const truth: LayeredEarth = { resistivity: [60, 200, 15], thickness: [3, 12] };
  const good = sounding(truth, 0.03);
  const spoiled = good.map((reading, i) =>
    i === 9 ? { ...reading, apparentResistivity: 2 * reading.apparentResistivity } : reading,
  );
  const bend = (fit: { predicted: number[] }, straight: { predicted: number[] }) =>
    Math.max(...fit.predicted.map((value, i) => Math.abs(Math.log(value / straight.predicted[i]!))));

  it('keeps one bad reading from bending the ground, and names it', () => {
    const straight = fitEarth(good, layered(3));
    const bent = fitEarth(spoiled, layered(3));
    const tolerant = fitEarth(spoiled, layered(3, { outlierTolerant: true }));
    expect(bend(bent, straight)).toBeGreaterThan(0.1);
    expect(bend(tolerant, straight)).toBeLessThan(0.03);
    expect(tolerant.downWeighted.map(({ index }) => index)).toEqual([9]);
    expect(tolerant.downWeighted[0]!.weight).toBeLessThan(0.05);
    expect(tolerant.residuals[9]).toBeLessThan(-15);
    expect(bent.downWeighted).toEqual([]);
    expect(tolerant.warnings).toEqual([
      'Reading 10 counts for little: more than 2.5 errors off this ground.',
    ]);
    const one = fitEarth(good, layered(1, { outlierTolerant: true }));
    expect(one.warnings.join(' ')).toMatch(/That is \d+ of 18, too many for single errors/);
  });

  it('does not buy a bed for an outlier when it chooses the count', () => {
    const tolerant = fitEarth(spoiled, layered('auto', { outlierTolerant: true }));
    expect(tolerant.earth.resistivity).toHaveLength(3);
  });

  it('changes little where there is no outlier', () => {
    const plain = fitEarth(good, layered(3));
    const tolerant = fitEarth(good, layered(3, { outlierTolerant: true }));
    expect(bend(tolerant, plain)).toBeLessThan(0.02);
    expect(tolerant.downWeighted).toEqual([]);
  });
});

describe('rows beside the readings', () => {
  it('have the derivatives that a ladder of steps finds', () => {
    const readings = sounding(TIED, 0.05).map((reading, i): Reading => ({
      ...reading,
      branch: i < 6 ? 'a' : 'b',
    }));
    const system = createResidualSystem(createForwardOperator(SPREADS), readings, {
      branchShiftSigma: 0.1,
      outlierTolerant: true,
      priors: [
        { on: 'resistivity', index: 0, value: 70, sigma: 0.2 },
        { on: 'thickness', index: 1, value: 3, sigma: 0.5 },
        { on: 'depth', index: 1, value: 9, sigma: 0.4 },
      ],
    });
    const p = Float64Array.from([Math.log(90), Math.log(8), Math.log(300), Math.log(5), Math.log(2), 0.07]);
    expect([system.readings, system.shifts, system.rows]).toEqual([18, 1, 22]);
    const residual = new Float64Array(22);
    const jacobian = new Float64Array(22 * 6);
    const chi2 = system.linearise(p, 3, residual, jacobian);
    expect(system.evaluate(p, 3, new Float64Array(22))).toBeCloseTo(chi2, 9);
    for (let j = 0; j < 6; j++) {
      const errors = [1e-3, 1e-4, 1e-5].map((step) => {
        const up = new Float64Array(22);
        const down = new Float64Array(22);
        system.evaluate(p.with(j, p[j]! + step), 3, up);
        system.evaluate(p.with(j, p[j]! - step), 3, down);
        return Math.max(
          ...up.map((value, i) => Math.abs((value - down[i]!) / (2 * step) - jacobian[i * 6 + j]!)),
        );
      });
      expect(Math.min(...errors)).toBeLessThan(1e-5);
    }
  });
});
