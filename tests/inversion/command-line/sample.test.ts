import { Readable, Writable } from 'node:stream';
import { expect, it } from 'vitest';
import { sampleEnsemble } from '../../../inversion';
import { runCommandLine } from '../../../server/cli/run-command-line';
import { sampleAnswerSchema, sampleSettingsSchema } from '../../../server/contract/sample';
import { posteriorCases } from '../support/posterior-cases';

const { readings, prior } = posteriorCases()[0]!;

async function sample(settings: object): Promise<{ status: number; answer: Record<string, unknown> }> {
  let text = '';
  const output = new Writable({
    write: (chunk: Buffer, _encoding, done) => {
      text += chunk.toString();
      done();
    },
  });
  const line = `${JSON.stringify({ id: 7, readings, settings })}\n`;
  const status = await runCommandLine(['sample'], Readable.from([line]), output, output);
  return { status, answer: JSON.parse(text) };
}

it('answers as the engine does, with the quantiles of each layer and the target', async () => {
  const target = { resistivity: [5, 40], minThickness: 5, topAbove: 10 };
  const settings = { layers: 3, prior, draws: 1000, seed: 2, target };
  const { status, answer } = await sample(settings);
  expect(status).toBe(0);
  const { id, ...result } = sampleAnswerSchema.parse(answer);
  expect(id).toBe(7);
  expect(result).toEqual(sampleEnsemble(readings, sampleSettingsSchema.parse(settings)));
  expect(result.quantiles!.resistivity).toHaveLength(3);
  expect(result.quantiles!.thickness).toHaveLength(2);
  expect(result.target!.probability).toBeGreaterThan(0.5);
});

it('answers with counts and depths where the number of layers is unknown', async () => {
  const { answer } = await sample({ layers: 'unknown', prior, draws: 400 });
  const result = sampleAnswerSchema.parse(answer);
  expect(result.quantiles).toBeNull();
  expect(result.layerCountProbability).toHaveLength(8);
  expect(result.resistivityAtDepth).toHaveLength(result.depths.length);
  expect(result.interfaceDensity).toHaveLength(result.depths.length);
});

it.each([
  [{ layers: 3 }, ['settings', 'prior']],
  [{ layers: 'auto', prior }, ['settings', 'layers']],
  [
    { layers: 'unknown', prior, priors: [{ on: 'depth', index: 0, value: 3, sigma: 1 }] },
    ['settings', 'priors'],
  ],
  [{ layers: 3, prior, chains: 4 }, ['settings', 'chains']],
])('refuses %j at its place', async (settings, path) => {
  const { status, answer } = await sample(settings);
  expect(status).toBe(1);
  expect(answer).toMatchObject({ id: 7, error: { code: 'invalid-line', path } });
});
