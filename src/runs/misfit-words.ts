import { isRejected, REJECTED_WORDS } from './rejected-fit';

/** The one name of the misfit, and what it means where it first stands. */
export const MISFIT_LABEL = 'χ²/N';
export const MISFIT_TITLE =
  'χ² per reading: the mean square of the misfits, each in its own standard error; about 1 where the errors are as stated';

/** A misfit that only so few would come below, were model and errors right, is too small for the errors. */
const TOO_CLOSE_CHANCE = 0.005;

/** What the misfit says of the model, by its chance; null where it cannot be tested. */
export function misfitWords(fit: { misfitProbability: number | null } | null): string | null {
  const chance = fit?.misfitProbability ?? null;
  if (chance === null) return null;
  if (isRejected(fit)) return REJECTED_WORDS;
  return chance > 1 - TOO_CLOSE_CHANCE
    ? 'comes closer to the readings than their errors ask for'
    : 'explains the readings';
}
