import { expect, it } from 'vitest';
import { groundHeightWords } from '../../../src/boreholes/ground-height-words';
import { waterLevelWords } from '../../../src/ui/water-level-words';

const plain = (words: string | null): string | null => words && words.replaceAll('\u00a0', ' ');

it.each([
  [3.9, '3.9 m below ground'],
  [-0.4, '0.4 m above ground'],
])('tells a water level of %d m as it was written', (depth, words) =>
  expect(plain(waterLevelWords(depth))).toBe(words),
);

it.each([
  [393.8, 396.4, 'ground 393.8 m, 2.6 m lower than here'],
  [407.7, 406.3, 'ground 407.7 m, 1.4 m higher than here'],
  [400, 400, 'ground 400 m, as high as here'],
  [393.8, null, 'ground 393.8 m'],
  [null, 396.4, null],
])('tells the ground of a hole at %s m beside that of a sounding at %s m', (hole, here, words) =>
  expect(plain(groundHeightWords(hole, here))).toBe(words),
);
