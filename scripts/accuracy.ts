import { readFileSync } from 'node:fs';
import { createForwardOperator, createRandomStream, fitLayered } from '../inversion';
import { integratedApparentResistivity } from '../inversion/reference/direct-integration';
import { randomEarth, randomSpread } from '../inversion/reference/random-cases';

interface ForwardSet {
  cases: {
    array: string;
    rho: number[];
    thickness: number[];
    readings: { AM: number | null; AN: number | null; BM: number | null; BN: number | null; rhoa: number }[];
  }[];
}
interface InversionSet {
  cases: {
    id: string;
    layers: number;
    relative_error: number;
    best_chi2_per_datum: number;
    readings: { halfAB: number; halfMN: number; rhoa: number }[];
  }[];
}

const EARTHS = 200;
const READINGS_PER_EARTH = 6;

function readSet<T>(name: string): T {
  return JSON.parse(readFileSync(new URL(`../tests/reference/${name}`, import.meta.url), 'utf8')) as T;
}

function report(what: string, values: number[]): void {
  const sorted = values.toSorted((a, b) => a - b);
  const worst = sorted.at(-1)!.toExponential(1);
  const median = sorted[Math.floor(sorted.length / 2)]!.toExponential(1);
  console.log(`${what.padEnd(52)} worst ${worst}  median ${median}  of ${sorted.length}`);
}

function referenceErrors(): Map<string, number[]> {
  const errors = new Map<string, number[]>();
  for (const one of readSet<ForwardSet>('forward.json').cases) {
    const spreads = one.readings.map(
      (r) => ({ type: 'electrodes', am: r.AM, an: r.AN, bm: r.BM, bn: r.BN }) as const,
    );
    const predicted = createForwardOperator(spreads).predict({
      resistivity: one.rho,
      thickness: one.thickness,
    });
    const found = one.readings.map((r, i) => Math.abs(predicted[i]! / r.rhoa - 1));
    errors.set(one.array, [...(errors.get(one.array) ?? []), ...found]);
  }
  return errors;
}

function randomErrors(): Map<string, number[]> {
  const random = createRandomStream(7);
  const errors = new Map<string, number[]>();
  for (let e = 0; e < EARTHS; e++) {
    const earth = randomEarth(random);
    for (let turn = 0; turn < READINGS_PER_EARTH; turn++) {
      const spread = randomSpread(random, turn);
      const slow = integratedApparentResistivity(spread, earth);
      const fast = createForwardOperator([spread]).predict(earth)[0]!;
      errors.set(spread.type, [...(errors.get(spread.type) ?? []), Math.abs(fast / slow - 1)]);
    }
  }
  return errors;
}

function reportFits(): void {
  const { cases } = readSet<InversionSet>('inversion.json');
  const started = performance.now();
  const ratios = cases.map((one) => {
    const readings = one.readings.map((r) => ({
      spread: { type: 'schlumberger', halfAB: r.halfAB, halfMN: r.halfMN } as const,
      apparentResistivity: r.rhoa,
      relativeError: one.relative_error,
    }));
    const fit = fitLayered(readings, {
      kind: 'layered',
      layers: one.layers,
      seed: 1,
      bounds: { resistivity: [0.1, 1e5], thickness: [0.02, 1000] },
      fixed: [],
      priors: [],
      outlierTolerant: false,
    });
    return (fit.chi2PerReading - 0.02) / one.best_chi2_per_datum;
  });
  const each = ((performance.now() - started) / cases.length).toFixed(1);
  const within = ratios.filter((ratio) => ratio <= 1.05).length;
  console.log(
    `layered fits within 5 % + 0.02 of the best χ² per reading   ${within} of ${cases.length}  (${each} ms each)`,
  );
}

const reference = referenceErrors();
for (const [kind, values] of reference) report(`reference set, ${kind}`, values);
report('reference set, all', [...reference.values()].flat());
const random = randomErrors();
for (const [kind, values] of random) report(`random earths against integration, ${kind}`, values);
report('random earths against integration, all', [...random.values()].flat());
reportFits();
