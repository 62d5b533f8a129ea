import { expect, it } from 'vitest';
import { fitAnswerSchema } from '../../../server/contract/command-line';
import { line, runCommand } from '../support/run-command';

const READINGS = [98, 95, 84, 66, 47, 36, 33, 37, 46, 60, 77, 96].map((apparentResistivity, i) => ({
  spread: { type: 'schlumberger', halfAB: Math.round(100 * 1.5 ** i) / 100, halfMN: i < 7 ? 0.3 : 0.9 },
  apparentResistivity,
  relativeError: 0.03,
  branch: i < 7 ? 'short' : 'long',
}));

const fitOf = (...settings: object[]) =>
  runCommand(['fit'], settings.map((one, id) => line({ id, readings: READINGS, settings: one })).join(''));

it('answers every kind of fit in one shape', async () => {
  const { status, answers } = await fitOf(
    { kind: 'layered' },
    { kind: 'layered', layers: 3, priors: [{ on: 'depth', index: 1, value: 12, sigma: 0.3 }] },
    { kind: 'layered', layers: 3, branchShiftSigma: 0.1, outlierTolerant: true },
    { kind: 'smooth' },
    { kind: 'smooth', layers: 20, targetMisfit: 1e-4 },
    { kind: 'stepped', branchShiftSigma: 0.1 },
  );
  expect(status).toBe(0);
  const [auto, tied, shifted, smooth, strict, stepped] = answers.map((answer) =>
    fitAnswerSchema.parse(answer),
  );
  expect(auto!.layerCounts!.map(({ layers }) => layers)).toEqual([1, 2, 3, 4, 5, 6]);
  const depth = tied!.earth.thickness[0]! + tied!.earth.thickness[1]!;
  expect(Math.abs(depth - 12)).toBeLessThan(1);
  expect(tied!.layerCounts).toBeNull();
  expect(shifted!.shifts.map(({ branch, held }) => [branch, held])).toEqual([
    ['short', true],
    ['long', false],
  ]);
  expect(smooth!.reachedTarget).toBe(true);
  expect(smooth!.chi2PerReading).toBeLessThanOrEqual(1.001);
  expect(strict).toMatchObject({ reachedTarget: false, status: 'target-out-of-reach' });
  expect(strict!.earth.resistivity).toHaveLength(20);
  expect(stepped!.shifts).toHaveLength(2);
  expect(new Set(answers.map((answer) => answer['engine']))).toEqual(new Set([auto!.engine]));
});

it('says which setting does not belong, and where', async () => {
  const { status, answers } = await fitOf(
    { kind: 'smooth', fixed: [{ on: 'thickness', index: 0, value: 2 }] },
    { kind: 'smooth', layers: 4 },
    { kind: 'layered', layers: 9 },
    { kind: 'layered', layers: 3, targetMisfit: 1 },
    { kind: 'layered', priors: [{ on: 'depth', index: 0, value: 2, sigma: 0.1 }] },
    { kind: 'layered', layers: 2, priors: [{ on: 'depth', index: 1, value: 2, sigma: 0.1 }] },
  );
  expect(status).toBe(1);
  expect(answers.map((answer) => (answer['error'] as { path: string[] }).path.join('.'))).toEqual([
    'settings.fixed',
    'settings.layers',
    'settings.layers',
    'settings.targetMisfit',
    'settings.priors',
    'settings.priors.0.index',
  ]);
});
