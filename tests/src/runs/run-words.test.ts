import { expect, it } from 'vitest';
import { fitSettingsSchema } from '../../../server/contract/fit';
import { cacheWords } from '../../../src/runs/cache-words';
import { settingsWords } from '../../../src/runs/run-settings-words';

const run = (number: number, computationKey: string) => ({ number, computationKey });

it('names the first run that asked the same, and no later one', () => {
  const runs = [run(4, 'x'), run(3, 'x'), run(2, 'x'), run(1, 'y')];
  expect(cacheWords(run(4, 'x'), runs)).toBe('from run B');
  expect(cacheWords(run(2, 'x'), runs)).toBe('computed before');
  expect(cacheWords(run(1, 'y'), runs)).toBe('computed before');
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
    'a model beside the curve: 120 Ω·m to 2.1 m, 45.2 Ω·m to 15.4 m, 3000 Ω·m below',
  );
  expect(start([80], [])).toBe('a model beside the curve: 80.0 Ω·m throughout');
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
