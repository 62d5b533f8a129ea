import { describe, expect, it } from 'vitest';
import { fitLine } from '../../../inversion';
import { fitLineAnswerSchema } from '../../../server/contract/fit-line';
import { alongLine, everyMetres, inventedLine } from '../line/invented-line';
import { line, runCommand } from '../support/run-command';

const ground = (x: number) => ({ resistivity: [100, 20, 300], thickness: [4, 12 + x / 100] });
const soundings = inventedLine(everyMetres(100, 4), ground).map((sounding, i) => ({
  id: `s${i}`,
  ...sounding,
}));
const contacts = [{ boundary: 1, depth: 17.5, sigma: 0.5 }];
const request = { id: 'L1', soundings, settings: { kind: 'layered', layers: 3 } };
const answer = async (more: object) => {
  const { status, answers } = await runCommand(['fit-line'], line({ ...request, ...more }));
  return { status, answer: answers[0]! };
};

describe('fit-line', () => {
  it('gives what the engine gives for each sounding by its id, with defaults filled in', async () => {
    const reversed = soundings.toReversed();
    const { status, answer: found } = await answer({ soundings: reversed });
    const { soundings: fitted, ...whole } = fitLine(reversed, alongLine(3));
    expect(status).toBe(0);
    expect(found).toEqual({
      id: 'L1',
      ...whole,
      soundings: fitted.map((result, i) => ({ id: `s${3 - i}`, ...result })),
    });
    expect(fitLineAnswerSchema.parse(found)).toEqual(found);
  });

  it('takes scales and boreholes, and chooses the layers of the line', async () => {
    const lateral = { resistivity: 0.1 };
    const boreholes = [{ x: 150, contacts }];
    const { answer: found } = await answer({
      settings: { kind: 'layered', layers: 'auto', lateral, boreholes },
    });
    const { layers, soundings: fitted } = fitLineAnswerSchema.parse(found);
    const expected = fitLine(
      soundings,
      alongLine('auto', { lateral: { resistivity: 0.1, depth: 0.2 }, boreholes }),
    );
    expect(layers).toBe(3);
    expect(fitted.map(({ earth }) => earth)).toEqual(expected.soundings.map(({ earth }) => earth));
  });

  it.each<[string, object, (string | number)[]]>([
    ['no soundings', { soundings: [] }, ['soundings']],
    [
      'a sounding without x',
      { soundings: [{ id: 1, readings: soundings[0]!.readings }] },
      ['soundings', 0, 'x'],
    ],
    ['a smooth fit', { settings: { kind: 'smooth' } }, ['settings', 'kind']],
    [
      'a scale of zero',
      { settings: { kind: 'layered', layers: 3, lateral: { depth: 0 } } },
      ['settings', 'lateral', 'depth'],
    ],
    [
      'a contact with a boundary that the layers do not have',
      { settings: { kind: 'layered', layers: 2, boreholes: [{ x: 0, contacts }] } },
      ['settings', 'boreholes', 0, 'contacts', 0, 'boundary'],
    ],
    [
      'a prior for another count, as for a sounding alone',
      { settings: { kind: 'layered', layers: 2, priors: [{ on: 'depth', index: 1, value: 5, sigma: 1 }] } },
      ['settings', 'priors', 0, 'index'],
    ],
    [
      'a field that is not known',
      { settings: { kind: 'layered', smoothness: 1 } },
      ['settings', 'smoothness'],
    ],
  ])('refuses %s with its place', async (_, more, path) => {
    const { status, answer: found } = await answer(more);
    expect(status).toBe(1);
    expect(found).toMatchObject({ id: 'L1', error: { path } });
  });
});
