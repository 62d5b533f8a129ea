import { expect, test } from 'vitest';
import { chartPalette } from '../../../src/charts/chart-palette';
import { runStyle } from '../../../src/charts/run-style';
import { runLetter } from '../../../server/contract/run-letter';

const palette = chartPalette(false);

test('the first thirty runs differ in hue or dash', () => {
  const looks = Array.from({ length: 30 }, (_, i) => JSON.stringify(runStyle(runLetter(i + 1), palette)));
  expect(new Set(looks).size).toBe(30);
});

test('neighbouring runs differ in both', () => {
  for (let number = 1; number <= 40; number++) {
    const [one, next] = [runStyle(runLetter(number), palette), runStyle(runLetter(number + 1), palette)];
    expect(next.color).not.toBe(one.color);
    expect(next.dash).not.toEqual(one.dash);
  }
});

test('a run keeps its look in both themes', () => {
  expect(runStyle('C', chartPalette(true)).dash).toEqual(runStyle('C', palette).dash);
});
