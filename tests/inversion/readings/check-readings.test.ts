import { describe, expect, it } from 'vitest';
import { createForwardOperator } from '../../../inversion/operator/forward-operator';
import { createRandomStream } from '../../../inversion/random';
import { checkReadings } from '../../../inversion/readings/check-readings';
import { deriveReading } from '../../../inversion/readings/derive-reading';
import type { FieldReading } from '../../../inversion/readings/field-reading';
import type { CheckedReading } from '../../../inversion/readings/reading-check';
import type { Spread } from '../../../inversion/types';

type Values = Partial<FieldReading>;
const sheet = (rows: readonly (readonly [Spread, Values])[], floor = 0.03): CheckedReading[] =>
  rows.map(([spread, values], index) => {
    const reading: FieldReading = {
      spread,
      voltageMv: null,
      currentMa: null,
      resistanceOhm: null,
      sheetApparentResistivityOhmM: null,
      standardError: null,
      excluded: null,
      ...values,
    };
    return { row: index + 1, reading, derived: deriveReading(reading, floor) };
  });
const rhoa = (value: number): Values => ({ sheetApparentResistivityOhmM: value });
const wenner = (spacing: number): Spread => ({ type: 'wenner', spacing });
const schlumberger = (halfAB: number, halfMN: number | null = null): Spread => ({
  type: 'schlumberger',
  halfAB,
  halfMN,
});
const kinds = (readings: CheckedReading[]) => checkReadings(readings).map(({ kind, rows }) => [kind, rows]);

describe('values written beside V and I', () => {
  it('tells both where the written ρa is not K·V/I', () => {
    // A solved paper prints 94.20 for a = 15 m and R = 0.6 Ω; K·R is 56.55: seen in print, recomputed
    const spacings = [5, 10, 15, 20, 25];
    const printed = [31.4, 50.24, 94.2, 50.24, 31.4];
    const readings = sheet(
      spacings.map((a, i) => [wenner(a), { resistanceOhm: 1 - 0.2 * i, ...rhoa(printed[i] ?? 0) }] as const),
    );
    const mismatches = checkReadings(readings).filter(({ kind }) => kind === 'sheet-mismatch');
    expect(mismatches.map(({ rows }) => rows)).toEqual([[3]]);
    expect(mismatches[0]?.message).toMatch(/94\.2 Ω·m, but K·V\/I is 56\.55 Ω·m/);
  });

  it('allows 2 % for rounding and no more', () => {
    const k = 2 * Math.PI;
    expect(kinds(sheet([[wenner(1), { resistanceOhm: 1, ...rhoa(k * 1.019) }]]))).toEqual([]);
    expect(kinds(sheet([[wenner(1), { resistanceOhm: 1, ...rhoa(k * 1.021) }]]))).toEqual([
      ['sheet-mismatch', [1]],
    ]);
  });

  it('tells an R that is not V/I, and nothing where MN was not recorded', () => {
    const values = { voltageMv: 20, currentMa: 10, resistanceOhm: 2.1 };
    expect(kinds(sheet([[wenner(1), values]]))).toEqual([['sheet-mismatch', [1]]]);
    expect(kinds(sheet([[schlumberger(10), { voltageMv: 2, currentMa: 10, ...rhoa(9) }]]))).toEqual([]);
  });

  it('tells a dipole–dipole voltage of the other sign', () => {
    const dipoles = (n: number): Spread => ({ type: 'dipole-dipole', dipole: 5, n });
    const readings = sheet([
      [dipoles(1), { resistanceOhm: -1 }],
      [dipoles(2), { resistanceOhm: 0.25 }],
      [dipoles(3), { resistanceOhm: -0.1 }],
    ]);
    expect(kinds(readings)).toEqual([['mixed-signs', [2]]]);
  });
});

describe('rises', () => {
  // Road exercise, Schlumberger: seen in print. The 7 m point rises with slope 2.06.
  const spacings = [1, 3, 5, 7, 10, 15, 20, 30, 40, 50];
  const printed = [450, 190, 100, 200, 90, 60, 45, 45, 45, 45];
  const road = spacings.map((halfAB, i) => [schlumberger(halfAB), rhoa(printed[i] ?? 0)] as const);

  it('tells a slope of 2.06 and the point that makes it', () => {
    const checks = checkReadings(sheet(road));
    expect(checks.map(({ kind, rows }) => [kind, rows])).toEqual([
      ['steep-rise', [3, 4]],
      ['far-from-trend', [4]],
    ]);
    expect(checks[0]?.message).toMatch(/slope 2\.06/);
  });

  it('says no more of a reading that is left out', () => {
    const left = road.map(
      ([spread, values], i) => [spread, i === 3 ? { ...values, excluded: 'misread' } : values] as const,
    );
    expect(kinds(sheet(left))).toEqual([]);
  });

  it('says nothing where the errors of the two readings explain it', () => {
    const pair = [
      [wenner(10), rhoa(100)],
      [wenner(11), rhoa(115)],
    ] as const;
    expect(kinds(sheet(pair, 0.03))).toEqual([]);
    expect(kinds(sheet(pair, 0.001))).toEqual([['steep-rise', [1, 2]]]);
  });

  it('does not compare across a change of MN, and leaves dipole–dipole out', () => {
    const change = [
      [schlumberger(10, 1), rhoa(100)],
      [schlumberger(11, 2), rhoa(130)],
    ] as const;
    expect(kinds(sheet(change))).toEqual([]);
    const dipoles = [1, 2].map((n) => [{ type: 'dipole-dipole', dipole: 5, n }, rhoa(100 * n ** 4)] as const);
    expect(kinds(sheet(dipoles))).toEqual([]);
  });
});

describe('branches of different MN', () => {
  const branches = (shift: number, from: number) => [
    ...[10, 14, 20, 28, 40].map((l) => [schlumberger(l, 0.5), rhoa(100)] as const),
    ...[from, from + 12, 2 * from].map((l) => [schlumberger(l, 2), rhoa(100 * shift)] as const),
  ];

  it('tells a step where spacings are shared, and how much the errors explain', () => {
    expect(kinds(sheet(branches(1.05, 28)))).toEqual([]);
    const [check] = checkReadings(sheet(branches(1.3, 28)));
    expect(check).toMatchObject({ kind: 'branch-jump', rows: [4, 5, 6, 7] });
    expect(check?.message).toMatch(/MN\/2 2 m lies 30 % above that of MN\/2 0\.5 m/);
  });

  it('compares at shared spacings alone where there are any, as a line between two spacings cuts a bend', () => {
    const narrow = [schlumberger(10, 0.5), schlumberger(20, 0.5), schlumberger(40, 0.5)];
    const wide = [schlumberger(20, 2), schlumberger(28, 2)];
    const values = [100, 100, 50, 100, 100];
    const readings = [...narrow, ...wide].map((spread, i) => [spread, rhoa(values[i] ?? 0)] as const);
    expect(kinds(sheet(readings))).toEqual([]);
  });

  it('tells a step where they overlap without a shared spacing', () => {
    expect(kinds(sheet(branches(1.3, 30)))).toEqual([['branch-jump', [4, 5, 6]]]);
  });

  it('tells a step over a gap, and follows the slope of both ends', () => {
    expect(kinds(sheet(branches(0.7, 50)))).toEqual([['branch-jump', [5, 6]]]);
    const falling = [10, 14, 20, 28].map((l) => [schlumberger(l, 0.5), rhoa(1000 / l)] as const);
    const on = [40, 56, 80].map((l) => [schlumberger(l, 2), rhoa(1000 / l)] as const);
    expect(kinds(sheet([...falling, ...on]))).toEqual([]);
  });
});

describe('repeats and wide MN', () => {
  it('tells repeats that differ by more than twice the error of their difference', () => {
    expect(
      kinds(
        sheet([
          [wenner(5), rhoa(100)],
          [wenner(5), rhoa(108)],
        ]),
      ),
    ).toEqual([]);
    const readings = sheet([
      [wenner(5), rhoa(100)],
      [wenner(10), rhoa(90)],
      [wenner(5), rhoa(110)],
    ]);
    expect(kinds(readings)).toEqual([['repeat-disagrees', [1, 3]]]);
  });

  it('warns of AB ≤ 5·MN (ASTM D6431) for Schlumberger alone', () => {
    const readings = sheet([
      [schlumberger(5, 1), rhoa(100)],
      [schlumberger(5.1, 1), rhoa(100)],
      [{ type: 'half-schlumberger', halfAB: 5, halfMN: 2 }, rhoa(100)],
    ]);
    expect(kinds(readings)).toEqual([['wide-mn', [1]]]);
  });
});

describe('points apart from their neighbours', () => {
  const spacings = [1, 1.5, 2.2, 3.3, 4.7, 6.8, 10, 15, 22, 33, 47, 68, 100];

  it.each([
    ['one', [10], [7]],
    ['two', [2.2, 33], [3, 10]],
  ])('names %s bad, and not the good ones beside', (_, bad, rows) => {
    const readings = sheet(spacings.map((a) => [wenner(a), rhoa(bad.includes(a) ? 300 : 100)] as const));
    const far = checkReadings(readings).filter(({ kind }) => kind === 'far-from-trend');
    expect(far.flatMap((check) => check.rows).toSorted((x, y) => x - y)).toEqual(rows);
  });

  it('doubts nothing on 300 seeded layered earths, whatever their contrast', () => {
    const random = createRandomStream(11);
    const spreads = spacings.map((halfAB) => schlumberger(halfAB, halfAB < 12 ? 0.15 : 1));
    const operator = createForwardOperator(spreads);
    let doubts = 0;
    for (let i = 0; i < 300; i++) {
      const layers = 2 + random.below(3);
      const earth = {
        resistivity: Array.from({ length: layers }, () => 10 ** (1 + 2 * random.uniform())),
        thickness: Array.from({ length: layers - 1 }, () => 10 ** (2 * random.uniform() - 0.3)),
      };
      const curve = operator.predict(earth);
      doubts += kinds(sheet(spreads.map((spread, k) => [spread, rhoa(curve[k] ?? 0)] as const))).length;
    }
    expect(doubts).toBe(0);
  });
});

// Seen in print: a university exercise, a graphically solved Wenner curve, and two utility traverses. All are sound.
it('doubts nothing in published soundings that follow a layered earth', () => {
  const a = [1, 1.5, 2, 3, 4.5, 6, 9, 13.5];
  const ohm = (values: readonly number[]) =>
    sheet(a.map((spacing, i) => [wenner(spacing), { resistanceOhm: values[i] ?? 0 }] as const));
  const fes = [
    28.5, 27.1, 25.3, 23.5, 21.7, 19.8, 18, 16.3, 14.5, 12.9, 11.3, 9.9, 8.7, 7.8, 7.1, 6.7, 6.5, 6.4,
  ];
  const graphical = [11938, 15770, 17341, 11058, 5026, 3820];
  expect(kinds(sheet(fes.map((value, i) => [wenner(40 + 20 * i), rhoa(value)] as const)))).toEqual([]);
  expect(kinds(sheet(graphical.map((value, i) => [wenner(2 ** i), rhoa(value)] as const)))).toEqual([]);
  expect(kinds(ohm([21.1, 14.43, 10.96, 6.52, 4.55, 3.37, 2.48, 1.609]))).toEqual([]);
  expect(kinds(ohm([20, 13.96, 10.07, 7.27, 4.59, 3.4, 2.3, 1.593]))).toEqual([]);
});
