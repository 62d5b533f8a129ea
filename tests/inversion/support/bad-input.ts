import fc from 'fast-check';
import { InversionError, type LayeredEarth, type Reading, type Spread } from '../../../inversion';

/** Every number a caller can get wrong. */
const WRONG = [0, -0, -1, NaN, Infinity, -Infinity, -1e300] as const;
/** Numbers that are allowed somewhere and absurd on the ground. */
const ABSURD = [5e-324, 1e-300, 1e-12, 1e-6, 1e6, 1e9, 1e15, 1e150, 1e300, Number.MAX_VALUE] as const;

const logUniform = (low: number, high: number): fc.Arbitrary<number> =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);

/** Mostly a number between the two, now and then one that is wrong or absurd. */
const spoilt = (low: number, high: number): fc.Arbitrary<number> =>
  fc.oneof(
    { weight: 12, arbitrary: logUniform(low, high) },
    { weight: 1, arbitrary: fc.constantFrom(...ABSURD) },
    { weight: 1, arbitrary: fc.constantFrom(...WRONG) },
  );

type Number = typeof spoilt;

const spreadOf = (number: Number): fc.Arbitrary<Spread> => {
  const length = number(1e-6, 1e5);
  const distance = fc.option(length, { freq: 5 });
  return fc.oneof(
    fc.record({ type: fc.constant('wenner' as const), spacing: length }),
    fc.record({ type: fc.constant('pole-pole' as const), spacing: length }),
    fc.record({ type: fc.constant('dipole-dipole' as const), dipole: length, n: number(0.1, 30) }),
    fc.record({
      type: fc.constantFrom('schlumberger' as const, 'half-schlumberger' as const),
      halfAB: length,
      halfMN: fc.option(length),
    }),
    fc.record({
      type: fc.constant('electrodes' as const),
      am: distance,
      an: distance,
      bm: distance,
      bn: distance,
    }),
  );
};

const earthOf = (number: Number): fc.Arbitrary<LayeredEarth> =>
  fc.integer({ min: 0, max: 9 }).chain((layers) =>
    fc.record({
      resistivity: fc.array(number(1e-4, 1e9), { minLength: layers, maxLength: layers }),
      thickness: fc.array(number(1e-6, 1e5), { minLength: Math.max(0, layers - 1), maxLength: layers }),
    }),
  );

const readingOf = (number: Number): fc.Arbitrary<Reading> =>
  fc.record({
    spread: spreadOf(number),
    apparentResistivity: number(1e-4, 1e9),
    relativeError: number(1e-6, 1),
  });

export const spoiltEarth = earthOf(spoilt);
export const spoiltSpread = spreadOf(spoilt);
export const spoiltReading = readingOf(spoilt);
export const spoiltNumber = spoilt;

/** Spreads that are right, on any scale. */
export const soundSpread: fc.Arbitrary<Spread> = fc.oneof(
  fc.record({ type: fc.constant('wenner' as const), spacing: logUniform(1e-3, 1e4) }),
  fc.record({ type: fc.constant('pole-pole' as const), spacing: logUniform(1e-3, 1e4) }),
  fc.record({
    type: fc.constant('dipole-dipole' as const),
    dipole: logUniform(1e-3, 1e3),
    n: fc.integer({ min: 1, max: 10 }),
  }),
  fc
    .record({
      halfAB: logUniform(1e-2, 1e4),
      share: fc.option(fc.double({ min: 0.01, max: 0.9, noNaN: true })),
    })
    .map(({ halfAB, share }) => ({
      type: 'schlumberger' as const,
      halfAB,
      halfMN: share === null ? null : halfAB * share,
    })),
);

/** Readings that are each allowed and need fit no ground at all: contrasts to 10¹³, errors from a millionth to 1. */
export const wildReading: fc.Arbitrary<Reading> = fc.record({
  spread: soundSpread,
  apparentResistivity: logUniform(1e-4, 1e9),
  relativeError: logUniform(1e-6, 1),
});

export const wildEarth: fc.Arbitrary<LayeredEarth> = fc.integer({ min: 1, max: 8 }).chain((layers) =>
  fc.record({
    resistivity: fc.array(logUniform(1e-4, 1e9), { minLength: layers, maxLength: layers }),
    thickness: fc.array(logUniform(1e-6, 1e5), { minLength: layers - 1, maxLength: layers - 1 }),
  }),
);

/** Places of numbers in plain data that are not finite. */
export function notFinite(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} = ${value}`];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, item]) => notFinite(item, `${path}.${key}`));
}

/** True where a path leads to something, or to a field that is missing from what it leads to. */
function leadsInto(input: unknown, path: readonly (string | number)[]): boolean {
  const holder = path
    .slice(0, -1)
    .reduce<unknown>(
      (value, key) => (typeof value === 'object' && value !== null ? Reflect.get(value, key) : undefined),
      input,
    );
  return path.length === 0 || (typeof holder === 'object' && holder !== null);
}

/**
 * What became of a computation on odd input: its answer, all of whose numbers must be finite, or `null` for a refusal, which
 * must be an `InversionError` that says something and whose path leads into `input`. Anything else is thrown.
 */
export function answerOrRefusal<T>(input: object, compute: () => T): T | null {
  let answer: T;
  try {
    answer = compute();
  } catch (error) {
    if (!(error instanceof InversionError)) throw error;
    if (error.message.length < 10 || !leadsInto(input, error.path))
      throw new Error(`a refusal that leads nowhere: ${error.message} at ${JSON.stringify(error.path)}`, {
        cause: error,
      });
    return null;
  }
  const faults = notFinite(answer);
  if (faults.length > 0) throw new Error(`numbers that are none: ${faults.slice(0, 5).join(', ')}`);
  return answer;
}

const wenner = (count: number, valueAt: (i: number) => number, relativeError = 0.05): Reading[] =>
  Array.from({ length: count }, (_, i) => ({
    spread: { type: 'wenner', spacing: 10 ** ((3 * i) / Math.max(1, count - 1)) },
    apparentResistivity: valueAt(i),
    relativeError,
  }));

/** Lists of readings, each allowed by itself, that no ground or too many grounds explain. */
export const ODD_SOUNDINGS: readonly [string, readonly Reading[]][] = [
  ['one reading', wenner(1, () => 100)],
  ['fewer readings than parameters', wenner(2, (i) => 100 + 50 * i)],
  ['one spread twenty times', Array.from({ length: 20 }, () => wenner(1, () => 100)[0]!)],
  [
    'one spread that reads 1 and 10⁸ by turns',
    Array.from({ length: 20 }, (_, i) => wenner(1, () => (i % 2 === 0 ? 1 : 1e8))[0]!),
  ],
  ['a rise of 10⁸ in one step', wenner(12, (i) => (i < 6 ? 1 : 1e8))],
  ['a fall of 10⁸ in one step', wenner(12, (i) => (i < 6 ? 1e8 : 1))],
  ['readings met exactly, with errors of a millionth', wenner(12, () => 100, 1e-6)],
  ['scattered readings with errors of a millionth', wenner(12, (i) => 100 + 50 * Math.sin(i), 1e-6)],
  ['errors of a thousandfold', wenner(12, (i) => 100 + 50 * Math.sin(i), 1e3)],
  ['the smallest and the largest values by turns', wenner(8, (i) => (i % 2 === 0 ? 1e-9 : 1e12))],
];

export const manyReadings = (count: number): Reading[] => wenner(count, (i) => 100 + 5 * Math.sin(i));

/** Tells how many of the outcomes were answers and how many refusals: a test of odd input must meet both. */
export function tally(): {
  readonly count: (outcome: unknown) => void;
  readonly answered: () => number;
  readonly refused: () => number;
} {
  let answers = 0;
  let refusals = 0;
  return {
    count: (outcome) => void (outcome === null ? (refusals += 1) : (answers += 1)),
    answered: () => answers,
    refused: () => refusals,
  };
}
