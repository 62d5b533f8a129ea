/** How well a value is known, by its 68 % factor (Auken & Christiansen 2004, Geophysics 69, 752–761; limits from memory). */
export type Determination = 'held' | 'well' | 'determined' | 'poorly' | 'not determined';

const LIMITS = [
  [1.2, 'well'],
  [1.5, 'determined'],
  [2, 'poorly'],
] as const satisfies readonly (readonly [number, Determination])[];

/** The class of a value whose 68 % factor (≥ 1) is `factor`; null = the readings give no limit. */
export function determinationOf(factor: number | null, isHeld: boolean): Determination {
  if (isHeld) return 'held';
  if (factor === null) return 'not determined';
  return LIMITS.find(([limit]) => factor < limit)?.[1] ?? 'not determined';
}

export const DETERMINATION_WORDS: Record<Determination, string> = {
  held: 'held',
  well: 'well determined',
  determined: 'determined',
  poorly: 'poorly determined',
  'not determined': 'not determined',
};

export const DETERMINATION_SOURCE =
  '68 % factor below 1.2: well determined; below 1.5: determined; below 2: poorly; else not determined (Auken & Christiansen 2004)';
