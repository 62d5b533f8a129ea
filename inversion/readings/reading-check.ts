import type { DerivedFieldReading, FieldReading } from './field-reading';

export type ReadingCheckKind =
  | 'sheet-mismatch'
  | 'steep-rise'
  | 'branch-jump'
  | 'wide-mn'
  | 'far-from-trend'
  | 'repeat-disagrees'
  | 'mixed-signs';

/** A doubt about readings. It alters nothing. */
export interface ReadingCheck {
  rows: number[];
  kind: ReadingCheckKind;
  message: string;
  rule: string;
  source: string;
}

/** A reading with its row number (from 1) and what follows from it. */
export interface CheckedReading {
  readonly row: number;
  readonly reading: FieldReading;
  readonly derived: DerivedFieldReading;
}

/** A number for a sentence, to so many digits. */
export const say = (value: number, digits = 3): string => String(Number(value.toPrecision(digits)));

/** How a crew names the place of a reading, lengths in m. */
export function nameOf({ reading: { spread }, row }: CheckedReading): string {
  switch (spread.type) {
    case 'schlumberger':
      return `AB/2 ${say(spread.halfAB, 6)} m`;
    case 'half-schlumberger':
      return `AO ${say(spread.halfAB, 6)} m`;
    case 'wenner':
    case 'pole-pole':
      return `a ${say(spread.spacing, 6)} m`;
    case 'dipole-dipole':
      return `a ${say(spread.dipole, 6)} m, n ${say(spread.n, 6)}`;
    case 'electrodes':
      return `row ${row}`;
  }
}
