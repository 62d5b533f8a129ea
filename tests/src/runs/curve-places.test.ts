import { expect, it } from 'vitest';
import { curvePlaces } from '../../../src/runs/curve-places';

const schlumberger = (halfAB: number, halfMN: number | null = 0.5) =>
  ({ type: 'schlumberger', halfAB, halfMN }) as const;

it('fills between the readings of one MN branch evenly in the logarithm, the readings among them', () => {
  const places = curvePlaces([schlumberger(100), schlumberger(10)]);
  expect(places).toHaveLength(25);
  expect(places[0]).toEqual({ spread: schlumberger(10), spacing: 10, startsBranch: false });
  expect(places.at(-1)!.spread).toEqual(schlumberger(100));
  const ratios = places.slice(1).map((place, i) => place.spacing / places[i]!.spacing);
  ratios.forEach((ratio) => expect(ratio).toBeCloseTo(10 ** (1 / 24), 9));
  expect(new Set(places.map(({ spread }) => 'halfMN' in spread && spread.halfMN))).toEqual(new Set([0.5]));
});

it('keeps each branch to its own MN, and begins anew where two overlap', () => {
  const places = curvePlaces([schlumberger(5), schlumberger(20), schlumberger(15, 5), schlumberger(60, 5)]);
  const starts = places.filter((place) => place.startsBranch);
  expect(starts.map(({ spread }) => spread)).toEqual([schlumberger(15, 5)]);
  expect(places.every(({ spread }) => 'halfMN' in spread && spread.halfMN !== null)).toBe(true);
});

it('draws through from one branch to the next where they do not overlap', () => {
  const places = curvePlaces([schlumberger(5), schlumberger(10), schlumberger(15, 5), schlumberger(60, 5)]);
  expect(places.some((place) => place.startsBranch)).toBe(false);
  expect(places.filter(({ spacing }) => spacing > 10 && spacing < 15)).toEqual([]);
});

it('goes by a for Wenner and by n for dipole–dipole', () => {
  const wenner = curvePlaces([
    { type: 'wenner', spacing: 2 },
    { type: 'wenner', spacing: 20 },
  ]);
  expect(wenner.map(({ spread }) => spread.type === 'wenner' && spread.spacing)).toContain(20);
  expect(wenner[0]!.spacing).toBeCloseTo(3, 12);
  expect(wenner).toHaveLength(25);
  const dipole = curvePlaces([
    { type: 'dipole-dipole', dipole: 10, n: 1 },
    { type: 'dipole-dipole', dipole: 10, n: 6 },
  ]);
  expect(dipole.every(({ spread }) => spread.type === 'dipole-dipole' && spread.dipole === 10)).toBe(true);
  expect(dipole.length).toBeGreaterThan(10);
});

it('takes repeated readings once, and leaves four free electrodes and dense sheets as they are', () => {
  expect(curvePlaces([schlumberger(10), schlumberger(10), schlumberger(10.1)])).toHaveLength(2);
  const free = (am: number) => ({ type: 'electrodes', am, an: 2 * am, bm: 2 * am, bn: am }) as const;
  expect(curvePlaces([free(10), free(100)])).toHaveLength(2);
  expect(curvePlaces(Array.from({ length: 300 }, (_, i) => schlumberger(10 + i)))).toEqual([]);
});
