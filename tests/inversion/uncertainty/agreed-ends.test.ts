import { expect, it } from 'vitest';
import { agreedEnds, around, type EarthEnds } from '../../../inversion/uncertainty/agreed-ends';

const ends = (low: number | null, high: number | null) => ({
  low: low === null ? null : Math.log(low),
  high: high === null ? null : Math.log(high),
});
const values = (list: EarthEnds['depth']) =>
  list.map(({ low, high }) =>
    [low, high].map((end) => (end === null ? null : Number(Math.exp(end).toPrecision(6)))),
  );
const earth = (more: Partial<EarthEnds>): EarthEnds => ({
  resistivity: [ends(10, 20), ends(null, 50)],
  thickness: [ends(1, 2)],
  depth: [ends(1, 2)],
  conductance: [ends(0.01, 5)],
  resistance: [ends(0.01, null)],
  ...more,
});

it('holds depths within the sums of the thicknesses, and in order', () => {
  const { depth } = agreedEnds(
    earth({
      thickness: [ends(1, 2), ends(null, 5), ends(20, 30)],
      depth: [ends(1, 2), ends(0.5, 9), ends(null, null)],
    }),
  );
  expect(values(depth)).toEqual([
    [1, 2],
    [1, 7],
    [21, 37],
  ]);
  const ordered = agreedEnds(
    earth({
      thickness: [ends(1, 2), ends(null, null)],
      depth: [ends(1.2, 2), ends(null, 1.8)],
    }),
  );
  expect(values(ordered.depth)).toEqual([
    [1.2, 1.8],
    [1.2, 1.8],
  ]);
});

it('holds S and T within what h and ρ allow, and leaves open what they leave open', () => {
  const found = agreedEnds(earth({}));
  expect(values(found.conductance)).toEqual([[0.05, 0.2]]);
  expect(values(found.resistance)).toEqual([[10, 40]]);
  const open = agreedEnds(
    earth({ thickness: [ends(null, null)], conductance: [ends(null, 5)], resistance: [ends(3, null)] }),
  );
  expect(values(open.conductance)).toEqual([[null, 5]]);
  expect(values(open.resistance)).toEqual([[3, null]]);
});

it('widens the ends at 95 % to those at 68 %', () => {
  const wide = around(
    earth({ depth: [ends(1, 3)], thickness: [ends(null, 2)] }),
    earth({ depth: [ends(0.5, 2)], thickness: [ends(1, 4)] }),
  );
  expect(values(wide.depth)).toEqual([[0.5, 3]]);
  expect(values(wide.thickness)).toEqual([[null, 4]]);
});
