import { expect, it } from 'vitest';
import { fitSettingsSchema } from '../../../server/contract/fit-settings';
import { answerFact, cacheWords } from '../../../src/runs/cache-words';
import { settingsWords } from '../../../src/runs/run-settings-words';

const run = (number: number, computationKey: string) => ({ number, computationKey });

it('names the first run that asked the same, and no later one', () => {
  const runs = [run(4, 'x'), run(3, 'x'), run(2, 'x'), run(1, 'y')];
  expect(cacheWords(run(4, 'x'), runs)).toBe('same as run B');
  expect(cacheWords(run(2, 'x'), runs)).toBe('computed before');
  expect(cacheWords(run(1, 'y'), runs)).toBe('computed before');
});

it('tells where an answer was computed, and in what time', () => {
  const runs = [run(3, 'x'), run(1, 'x')];
  const told = (fromCache: boolean, number = 3, durationMs: number | null = 820) =>
    answerFact({ ...run(number, 'x'), fromCache, durationMs, engineVersion: '7' }, runs);
  expect(told(true)).toEqual({
    label: 'Answered',
    value: 'by run A, computed there in\u00a0820\u00a0ms, engine 7',
  });
  expect(told(true, 1).value).toContain('by an earlier computation of the same, computed there');
  expect(told(false)).toEqual({ label: 'Computed', value: 'in\u00a0820\u00a0ms, engine 7' });
  expect(told(false, 3, null).value).toBe('engine 7');
});

it('tells the model that a fit started from, by depth', () => {
  const start = (resistivity: number[], thickness: number[]) =>
    settingsWords(
      fitSettingsSchema.parse({
        kind: 'layered',
        layers: resistivity.length,
        start: { resistivity, thickness },
      }),
    )
      .find(({ label }) => label === 'Start')
      ?.value.replaceAll('\u00a0', ' ');
  expect(start([120, 45.16, 3000], [2.1, 13.3])).toBe(
    'a given model: 120 Ω·m to 2.10 m, 45.2 Ω·m to 15.4 m, 3000 Ω·m below',
  );
  expect(start([80], [])).toBe('a given model: 80.0 Ω·m throughout');
});

it('tells bounds that are not the usual ones as they were given', () => {
  const settings = fitSettingsSchema.parse({
    kind: 'layered',
    layers: 3,
    bounds: { resistivity: [0.1, 25000], thickness: [0.02, 1000] },
  });
  const facts = settingsWords(settings).map(({ label, value }) => `${label} ${value}`);
  expect(facts).toContain('Resistivity within 0.1 to 25\u202f000\u00a0Ω·m');
  expect(facts.some((fact) => fact.startsWith('Thickness'))).toBe(false);
});

it('says of each kind of fit what it was asked for', () => {
  const facts = (settings: object) =>
    settingsWords(fitSettingsSchema.parse(settings)).map(({ label, value }) =>
      `${label}: ${value}`.replaceAll('\u00a0', ' '),
    );
  expect(facts({ kind: 'smooth', targetMisfit: 0.8 })).toEqual([
    'Ground: smooth, the usual grid of cells',
    'Target: χ²/N 0.800',
    'Seed: 1',
  ]);
  expect(facts({ kind: 'stepped', layers: 24 })[0]).toBe('Ground: few steps, 24 cells');
  const tied = facts({
    kind: 'layered',
    layers: 3,
    priors: [
      { on: 'depth', index: 1, value: 12.4, sigma: 0.3 },
      { on: 'resistivity', index: 0, value: 80, sigma: 0.2 },
    ],
    branchShiftSigma: 0.1,
    outlierTolerant: true,
  });
  expect(tied).toContain(
    'Known beforehand: base of bed 2 at 12.4 ± 0.300 m; resistivity of bed 1 near 80.0 Ω·m ×÷ 1.22',
  );
  expect(tied).toContain('Branches: shifted, each within about 10 %');
  expect(tied).toContain('Outliers: count for less');
});
