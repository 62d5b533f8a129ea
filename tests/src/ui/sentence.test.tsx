import { renderToStaticMarkup } from 'react-dom/server';
import { expect, it } from 'vitest';
import { Sentence } from '../../../src/ui/sentence';

const kept = (text: string): string[] =>
  [
    ...renderToStaticMarkup(<Sentence text={text} />).matchAll(
      /<span class="whitespace-nowrap">(.*?)<\/span>/g,
    ),
  ].map(([, words = '']) => words);

it('keeps symbols, ranges and units on one line, and the words as they are', () => {
  expect(kept('better known by S\u00a0=\u00a0h/ρ than by h')).toEqual(['S\u00a0=\u00a0h/ρ']);
  expect(kept('(χ²/N 0.551 and 28.9)')).toEqual(['(χ²/N']);
  expect(kept('a base at 12.4–36.0 m, 95 % of it')).toEqual(['12.4–36.0\u00a0m,', '95\u00a0%']);
  expect(kept('bed 2 may go')).toEqual([]);
});
