import { expect, it } from 'vitest';
import type { Borehole } from '../../../server/contract/surveys';
import { nearestBoreholes } from '../../../src/boreholes/nearest-boreholes';

const hole = (name: string, xM: number | null, yM: number | null) => ({ name, xM, yM }) as Borehole;
const HOLES = [hole('far', 400, 300), hole('near', 3, 4), hole('nowhere', null, 0), hole('next', 0, -50)];

it('gives the holes nearest to a place with their distance, and none without a position', () => {
  const names = (place: { xM: number | null; yM: number | null }, count = 2) =>
    nearestBoreholes(place, HOLES, count).map(({ borehole, distanceM }) => [borehole.name, distanceM]);
  expect(names({ xM: 0, yM: 0 })).toEqual([
    ['near', 5],
    ['next', 50],
  ]);
  expect(names({ xM: 0, yM: 0 }, 9)).toHaveLength(3);
  expect(names({ xM: null, yM: 0 })).toEqual([]);
});
