import { expect, it } from 'vitest';
import { clashesOf } from '../../../src/ui/merge-versions';

const field = (base: string, mine: string, theirs: string) => ({
  key: 'k',
  label: 'Title',
  base,
  mine,
  theirs,
});

it('leaves out fields in which both versions say the same', () => {
  expect(clashesOf([field('a', 'b', 'b'), field('a', 'a', 'a')])).toEqual([]);
});

it('takes the side that changed, and mine where both did', () => {
  const [onlyTheirs, onlyMine, both] = clashesOf([
    field('a', 'a', 'x'),
    field('a', 'y', 'a'),
    field('a', 'y', 'x'),
  ]);
  expect(onlyTheirs).toMatchObject({ choice: 'theirs', isContested: false });
  expect(onlyMine).toMatchObject({ choice: 'mine', isContested: false });
  expect(both).toMatchObject({ choice: 'mine', isContested: true });
});
