import { expect, test } from 'vitest';
import { chartPalette } from '../../../src/charts/chart-palette';
import { runStyle } from '../../../src/charts/run-style';
import { runLetter } from '../../../src/ui/format';

const palette = chartPalette(false);

test('the first thirty runs differ in hue or dash', () => {
  const looks = Array.from({ length: 30 }, (_, index) => JSON.stringify(runStyle(runLetter(index), palette)));
  expect(new Set(looks).size).toBe(30);
});

test('neighbouring runs differ in both', () => {
  for (let index = 0; index < 40; index++) {
    const [one, next] = [runStyle(runLetter(index), palette), runStyle(runLetter(index + 1), palette)];
    expect(next.color).not.toBe(one.color);
    expect(next.dash).not.toEqual(one.dash);
  }
});

test('a run keeps its look in both themes', () => {
  expect(runStyle('C', chartPalette(true)).dash).toEqual(runStyle('C', palette).dash);
});
