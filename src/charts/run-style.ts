import type { ChartPalette } from './chart-palette';

/** Dash patterns in px; their count shares no divisor with the hues', so the first 30 runs all differ. */
const DASHES: readonly (readonly number[])[] = [[], [7, 4], [2, 3], [9, 3, 2, 3], [13, 4]];

export interface RunStyle {
  color: string;
  /** Empty = a full line. */
  dash: readonly number[];
}

/** The look of a run, by its letter, the same wherever the run is drawn. */
export function runStyle(letter: string, palette: ChartPalette): RunStyle {
  const index = runIndex(letter);
  return {
    color: palette.runs[index % palette.runs.length] ?? palette.ink,
    dash: DASHES[index % DASHES.length] ?? [],
  };
}

/** Place of a run in the ledger: A 0, B 1, … Z 25, AA 26. */
function runIndex(letter: string): number {
  let index = 0;
  for (const character of letter.toUpperCase()) {
    const digit = character.charCodeAt(0) - 64;
    if (digit < 1 || digit > 26) return 0;
    index = index * 26 + digit;
  }
  return Math.max(0, index - 1);
}
