import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync } from 'node:fs';
import { PassThrough, Readable } from 'node:stream';
import { text } from 'node:stream/consumers';
import { setTimeout as delay } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { createForwardOperator, fitLayered } from '../../../inversion';
import { runCommandLine } from '../../../server/cli/run-command-line';
import {
  COMMAND_LINE_SCHEMAS,
  fitAnswerSchema,
  forwardAnswerSchema,
} from '../../../server/contract/command-line';
import { layered } from '../support/fit-settings';
import { line, runCommand as run, sink } from '../support/run-command';

const EARTH = { resistivity: [100, 20], thickness: [3] };
const WENNER = { type: 'wenner', spacing: 5 } as const;

/** Resolves when a count has begun and stood still for a while. */
async function standstill(count: () => number): Promise<void> {
  for (let before = 0, still = 0; still < 5; before = count()) {
    await delay(50);
    still = count() > 0 && count() === before ? still + 1 : 0;
  }
}

describe('forward', () => {
  it('answers each line in order, as the engine does, with K', async () => {
    const spreads = [WENNER, { type: 'schlumberger', halfAB: 10, halfMN: null }] as const;
    const { status, answers } = await run(
      ['forward'],
      line({ id: 'a', earth: EARTH, spreads }) + line({ id: 2, earth: EARTH, spreads: [WENNER] }),
    );
    expect(status).toBe(0);
    expect(answers.map((answer) => answer.id)).toEqual(['a', 2]);
    const first = forwardAnswerSchema.parse(answers[0]);
    expect(first.apparentResistivity).toEqual(Array.from(createForwardOperator(spreads).predict(EARTH)));
    expect(first.geometricFactor).toEqual([10 * Math.PI, null]);
  });

  it('takes CRLF, blank lines, a byte order mark and a last line without an end', async () => {
    const good = JSON.stringify({ id: 1, earth: EARTH, spreads: [WENNER] });
    const { status, answers } = await run(['forward'], `\uFEFF${good}\r\n\r\n   \n${good}`);
    expect(status).toBe(0);
    expect(answers).toHaveLength(2);
  });

  it('answers a bad line on its own line, the good ones still, and ends with 1', async () => {
    const good = line({ id: 'good', earth: EARTH, spreads: [WENNER] });
    const { status, answers } = await run(['forward'], `${good}not json\n${good}`);
    expect(status).toBe(1);
    expect(answers.map((answer) => answer.id)).toEqual(['good', null, 'good']);
    expect(answers[1]!.error).toMatchObject({ code: 'invalid-json', path: [] });
  });

  it.each<[string, object, object]>([
    [
      'a length below zero',
      { id: 1, earth: EARTH, spreads: [{ type: 'wenner', spacing: -5 }] },
      {
        path: ['spreads', 0, 'spacing'],
        message: 'spreads[0].spacing is too small; found -5; allowed: above 0',
      },
    ],
    [
      'a spread that is not one',
      { id: 1, earth: EARTH, spreads: [WENNER, { type: 'wennr', spacing: 5 }] },
      {
        path: ['spreads', 1, 'type'],
        message:
          'spreads[1].type is none of what can be chosen; found "wennr"; allowed: schlumberger, half-schlumberger, wenner, pole-pole, dipole-dipole, electrodes',
      },
    ],
    [
      'one thickness too many',
      { id: 1, earth: { resistivity: [1], thickness: [2] }, spreads: [WENNER] },
      {
        path: ['earth', 'thickness'],
        message: 'earth.thickness must have one entry fewer than resistivity; found [2]',
      },
    ],
    [
      'MN beyond AB',
      { id: 1, earth: EARTH, spreads: [{ type: 'schlumberger', halfAB: 5, halfMN: 6 }] },
      { code: 'spread-halfmn', path: ['spreads', 0, 'halfMN'] },
    ],
    [
      'electrodes that cancel',
      { id: 1, earth: EARTH, spreads: [WENNER, { type: 'electrodes', am: 1, an: 1, bm: 2, bn: 2 }] },
      { code: 'spread-cancels', path: ['spreads', 1, 'am'] },
    ],
    [
      'a key that is not known',
      { id: 1, earth: EARTH, spreads: [WENNER], colour: 'red' },
      {
        code: 'invalid-line',
        path: ['colour'],
        message: 'colour is no known field; found "red"',
      },
    ],
    [
      'an unknown key of a spread',
      { id: 1, earth: EARTH, spreads: [{ ...WENNER, n: 2 }] },
      { path: ['spreads', 0, 'n'], message: 'spreads[0].n is no known field; found 2' },
    ],
    [
      'a number written as words',
      { id: 1, earth: { resistivity: ['NaN'], thickness: [] }, spreads: [WENNER] },
      { path: ['earth', 'resistivity', 0], message: 'earth.resistivity[0] is not a number; found "NaN"' },
    ],
    [
      'MN that is neither given nor said to be unrecorded',
      { id: 1, earth: EARTH, spreads: [{ type: 'schlumberger', halfAB: 10 }] },
      {
        path: ['spreads', 0, 'halfMN'],
        message: 'spreads[0].halfMN is missing; it must be a number, or null where MN was not recorded',
      },
    ],
  ])('refuses %s with its place', async (_, request, error) => {
    const { status, answers } = await run(['forward'], line(request));
    expect(status).toBe(1);
    expect(answers).toEqual([{ id: 1, error: expect.objectContaining(error) }]);
  });

  it('refuses a line that is JSON but not an object, and an id of the wrong kind', async () => {
    const { answers } = await run(['forward'], `[1]\n${line({ id: [1], earth: EARTH, spreads: [WENNER] })}`);
    expect(answers.map((answer) => answer.id)).toEqual([null, null]);
    expect(answers[0]!.error).toMatchObject({
      message: 'the line is not an object with named fields; found [1]',
      path: [],
    });
    expect(answers[1]!.error).toMatchObject({
      message: 'id is none of what can be chosen; found [1]; allowed: text or a number',
      path: ['id'],
    });
  });

  it('calls a number too large for a double by its name', async () => {
    const { answers } = await run(
      ['forward'],
      '{"id":1,"earth":{"resistivity":[1e999],"thickness":[]},"spreads":[{"type":"wenner","spacing":5}]}\n',
    );
    expect(answers[0]!.error).toMatchObject({
      message: 'earth.resistivity[0] is not a number; found Infinity',
    });
  });

  it(
    'waits for a reader that does not read, holding little, and loses nothing',
    { timeout: 60_000 },
    async () => {
      const all = 10_000;
      let taken = 0;
      function* lines() {
        for (; taken < all; taken++) yield line({ id: taken, earth: EARTH, spreads: [WENNER] });
      }
      const out = new PassThrough({ highWaterMark: 1024 });
      const running = runCommandLine(['forward'], Readable.from(lines()), out, sink().stream);
      await standstill(() => taken);
      expect(taken).toBeLessThan(all / 2);
      expect(out.writableLength + out.readableLength).toBeLessThan(4096);
      const read = text(out);
      expect(await running).toBe(0);
      out.end();
      const ids = (await read)
        .trimEnd()
        .split('\n')
        .map((answer) => JSON.parse(answer).id);
      expect(ids).toEqual(Array.from({ length: all }, (_, i) => i));
    },
  );
});

describe('fit', () => {
  const readings = [1, 2, 4, 8, 16, 32].map((spacing, i) => ({
    spread: { type: 'wenner', spacing } as const,
    apparentResistivity: [95, 80, 52, 30, 23, 21][i]!,
    relativeError: 0.03,
  }));

  it('gives what the engine gives, with defaults filled in', async () => {
    const { status, answers } = await run(
      ['fit'],
      line({ id: 's1', readings, settings: { kind: 'layered', layers: 2 } }),
    );
    expect(status).toBe(0);
    expect(answers[0]).toEqual({ id: 's1', ...fitLayered(readings, layered(2)) });
    expect(fitAnswerSchema.parse(answers[0])).toEqual(answers[0]);
  });

  it('chooses the layers itself when asked, and takes the label of a branch', async () => {
    const labelled = readings.map((reading) => ({ ...reading, branch: 'a' }));
    const { answers } = await run(
      ['fit'],
      line({ id: 1, readings: labelled, settings: { kind: 'layered', layers: 'auto', seed: 5 } }),
    );
    const counts = fitAnswerSchema.parse(answers[0]).layerCounts!;
    expect(counts.map((count) => count.layers)).toEqual([1, 2, 3]);
  });

  it.each<[object, (string | number)[]]>([
    [{ layers: 9 }, ['settings', 'layers']],
    [
      { layers: 2, bounds: { resistivity: [10, 1], thickness: [1, 2] } },
      ['settings', 'bounds', 'resistivity'],
    ],
    [{ layers: 2, fixed: [{ on: 'thickness', index: 1, value: 3 }] }, ['settings', 'fixed', 0, 'index']],
    [
      {
        layers: 2,
        fixed: [
          { on: 'thickness', index: 0, value: 3 },
          { on: 'thickness', index: 0, value: 4 },
        ],
      },
      ['settings', 'fixed', 1],
    ],
    [{ layers: 1, fixed: [{ on: 'thickness', index: 0, value: 3 }] }, ['settings', 'fixed', 0, 'index']],
    [{ layers: 2, seed: -1 }, ['settings', 'seed']],
  ])('refuses the settings %j', async (settings, path) => {
    const { status, answers } = await run(
      ['fit'],
      line({ id: 1, readings, settings: { kind: 'layered', ...settings } }),
    );
    expect(status).toBe(1);
    expect(answers[0]).toMatchObject({ id: 1, error: { code: 'invalid-line', path } });
  });
});

describe('schema', () => {
  it('lists its names, and prints each as JSON Schema', async () => {
    const names = (await run(['schema'])).output.trim().split('\n');
    expect(names).toEqual(Object.keys(COMMAND_LINE_SCHEMAS));
    for (const name of names) {
      const { status, output } = await run(['schema', name]);
      expect(status).toBe(0);
      expect(JSON.parse(output)).toHaveProperty('$schema');
    }
    expect((await run(['schema', 'fit-status'])).output).toContain('converged-gradient');
  });

  it('refuses a name that is not one', async () => {
    const { status, errors } = await run(['schema', 'nothing']);
    expect(status).toBe(2);
    expect(errors).toContain('"nothing" is not a schema; there are spread, earth');
  });
});

describe('the command itself', () => {
  it.each([[[]], [['plot']], [['forward', 'file.jsonl']]])('%j gives the usage and 2', async (args) => {
    const { status, errors, output } = await run(args);
    expect(status).toBe(2);
    expect(errors).toContain('Usage: npm run -s layerwell -- COMMAND');
    expect(output).toBe('');
  });

  it(
    'runs as a process over the examples, and ends quietly when its reader goes away',
    { timeout: 60_000 },
    async () => {
      const input = readFileSync(new URL('../../../examples/forward.jsonl', import.meta.url), 'utf8');
      const start = () =>
        spawn(process.execPath, ['--import', 'tsx', 'server/cli.ts', 'forward'], {
          stdio: ['pipe', 'pipe', 'pipe'],
        });
      const whole = start();
      let output = '';
      whole.stdout.on('data', (chunk: Buffer) => (output += chunk.toString()));
      whole.stdin.end(input);
      expect(await once(whole, 'close')).toEqual([0, null]);
      expect(output.trim().split('\n')).toHaveLength(input.trim().split('\n').length);

      const cut = start();
      let complaints = '';
      cut.stderr.on('data', (chunk: Buffer) => (complaints += chunk.toString()));
      cut.stdin.on('error', () => undefined);
      cut.stdout.once('data', () => cut.stdout.destroy());
      cut.stdin.end(input.repeat(3000));
      await once(cut, 'close');
      expect(complaints).toBe('');
    },
  );
});
