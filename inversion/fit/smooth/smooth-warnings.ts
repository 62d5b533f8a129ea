import { threeDigits } from '../../three-digits';
import type { Reading } from '../../types';
import type { ReadingFit } from '../residual-system';
import { steepRises } from './steep-rises';

export interface SmoothWarningInput {
  readonly kind: 'smooth' | 'stepped';
  readonly readings: readonly Reading[];
  readonly readingFit: ReadingFit;
  readonly target: number;
  readonly reached: boolean;
  /** the target is above what a uniform ground has */
  readonly uniform: boolean;
  /** counted from 1 */
  readonly cellsAtBound: readonly number[];
}

/** From this |residual| on a reading is named as one that the ground does not pass. */
const FAR_OFF = 2.5;

const WHAT_IT_IS = {
  smooth:
    'The cells are a fixed grid and no beds: where the ground changes at once, the smoothest one draws the change out over a range of depth.',
  stepped:
    'The cells are a fixed grid: a boundary can only stand at one of its depths, and another ground with as few steps may fit as well.',
} as const;

/** Share of cells whose 95 % range held the truth: 60 noisy reference soundings of 2–5 sharp beds, every cell of the usual grid. */
const HELD = { smooth: '69 %', stepped: '61 %' } as const;

const ranges = (kind: keyof typeof HELD): string =>
  `The range of a cell is what is left to doubt of a ground of this roughness alone. Sharp beds often lie outside of it: on trial soundings of 2 to 5 beds it held the truth in ${HELD[kind]} of the cells, not 95 %.`;

/** Why no ground of flat cells comes down to the target. */
function whyNot({ readings, readingFit, target, cellsAtBound }: SmoothWarningInput): string {
  const perReading = readingFit.chi2 / readings.length;
  const found = `The target of χ²/N ${threeDigits(target)} is out of reach; the closest ground of flat cells has ${threeDigits(perReading)}.`;
  const rises = steepRises(readings);
  if (rises.length > 0) {
    const pairs = rises.map(([from, to]) => `${from + 1} to ${to + 1}`).join(', ');
    return `${found} ρa rises faster than the spacing from ${rises.length === 1 ? 'reading' : 'readings'} ${pairs}, which no ground of flat beds does.`;
  }
  if (cellsAtBound.length > 0)
    return `${found} The bounds of resistivity hold ${cellsAtBound.length === 1 ? 'a cell' : `${cellsAtBound.length} cells`} back.`;
  const far = readingFit.residuals.flatMap((r, i) => (Math.abs(r) > FAR_OFF ? [i + 1] : []));
  if (far.length > 0)
    return `${found} Furthest from it ${far.length === 1 ? 'is reading' : 'are readings'} ${far.join(', ')}: misread values, shifts between branches of MN, or ground that is not flat.`;
  return `${found} No reading stands out: the stated errors are smaller than the scatter of the readings.`;
}

/** Sentences that belong to a smooth or stepped ground alone. */
export function smoothWarnings(input: SmoothWarningInput): string[] {
  const sentences = input.reached ? [] : [whyNot(input)];
  if (input.uniform) {
    sentences.push(
      'A uniform ground already meets the target: these readings, with these errors, show no layers.',
    );
  } else {
    sentences.push(WHAT_IT_IS[input.kind]);
  }
  if (input.cellsAtBound.length > 0)
    sentences.push(
      `${input.cellsAtBound.length === 1 ? 'Cell' : 'Cells'} ${input.cellsAtBound.join(', ')} ended on a bound of resistivity; a closer fit may lie beyond it.`,
    );
  return [...sentences, ranges(input.kind)];
}
