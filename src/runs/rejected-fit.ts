/** A misfit less likely than this, were model and errors right, means that the readings reject the model. */
const REJECTION_CHANCE = 0.01;

export const REJECTED_WORDS = 'does not explain the readings';
export const REJECTED_RANGES_NOTE =
  'The 95\u00a0% ranges assume that the model explains the readings, which this one does not.';

/** Whether the readings reject a fit; one whose misfit cannot be tested is not rejected. */
export function isRejected(fit: { misfitProbability: number | null } | null | undefined): boolean {
  const chance = fit?.misfitProbability ?? null;
  return chance !== null && chance < REJECTION_CHANCE;
}
