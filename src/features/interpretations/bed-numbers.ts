import type { FitResult } from '../../../server/contract/fit-result';
import { determinationOf, DETERMINATION_WORDS } from '../../../inversion';
import { isHeldRange } from '../../../inversion/held-range';
import { boundaryDepths } from '../../charts/chart-data';
import { isRejected } from '../../runs/rejected-fit';
import { formatLength, formatRange, formatResistivity, withUnit } from '../../ui/format';

export interface BedNumbers {
  resistivityOhmM: number;
  resistivity: string;
  resistivityRange: string;
  /** How well it is determined; null where it was held, or where the readings reject the run. */
  resistivityGrade: string | null;
  /** "3.1 to 9.0 m" or "below 9.0 m". */
  place: string;
  /** Of the base, 95 %; null for the half-space. */
  baseRange: string | null;
  baseGrade: string | null;
}

/** What the run says of one bed, as text. */
export function bedNumbers(result: FitResult, layerIndex: number): BedNumbers {
  const bases = boundaryDepths(result.earth);
  const top = layerIndex === 0 ? 0 : (bases[layerIndex - 1] ?? 0);
  const base = bases[layerIndex];
  const resistivityOhmM = result.earth.resistivity[layerIndex] ?? Number.NaN;
  const metres = (text: string) => withUnit(text, 'm');
  return {
    resistivityOhmM,
    resistivity: withUnit(formatResistivity(resistivityOhmM), 'Ω·m'),
    resistivityRange: formatRange(result.intervals.resistivity[layerIndex] ?? [null, null]),
    resistivityGrade: gradeWords(result, 'resistivity', layerIndex),
    place:
      base === undefined
        ? `below ${metres(formatLength(top))}`
        : `${formatLength(top)} to ${metres(formatLength(base))}`,
    baseRange: base === undefined ? null : formatRange(result.intervals.depth[layerIndex] ?? [null, null]),
    baseGrade: base === undefined ? null : gradeWords(result, 'depth', layerIndex),
  };
}

function gradeWords(result: FitResult, on: 'resistivity' | 'depth', index: number): string | null {
  const range = result.intervals[on][index] ?? ([null, null] as const);
  if (isHeldRange(range) || isRejected(result)) return null;
  return DETERMINATION_WORDS[determinationOf(result.factors[on][index] ?? null, false)];
}
