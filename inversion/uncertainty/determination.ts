/**
 * How well a value is known, by its factor of one standard deviation (Auken & Christiansen 2004, Geophysics 69, 752–761; limits
 * from memory). They take it from the covariance; here it is what `parameterDoubt` gives: the larger of the 68 % reach and of the
 * 95 % reach to the power 1/1.96, so that no value is called well determined whose 95 % range is wide or open.
 */
export type Determination = 'held' | 'well' | 'determined' | 'poorly' | 'not determined';

const LIMITS = [
  [1.2, 'well'],
  [1.5, 'determined'],
  [2, 'poorly'],
] as const satisfies readonly (readonly [number, Determination])[];

/** The class of a value whose factor (≥ 1) is `factor`; null = the readings give no limit on one side or both. */
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
  'Factor of one standard deviation (68 %, or that of the 95 % range where it is larger) below 1.2: well determined; below 1.5: determined; below 2: poorly; else, or with an open range, not determined (after Auken & Christiansen 2004)';
