import type { FitStatus } from '../types';

/** What each stop reason means, in a sentence for the reader of a result. */
export const FIT_STATUS_MESSAGES: Record<FitStatus, string> = {
  'converged-gradient': 'The misfit no longer has a slope in any direction that the bounds leave free.',
  'converged-step': 'The next step would change no value by more than one part in a hundred million.',
  'converged-decrease': 'Three steps in a row lowered the misfit by less than one part in a million.',
  'iteration-limit': 'The step limit was reached; the model is the best found, and may still improve.',
  'no-descent': 'No smaller misfit was found in any direction from the best model.',
  'target-reached': 'The simplest ground of this kind that was found with its misfit at the target.',
  'target-out-of-reach':
    'No ground of this kind comes down to the target misfit; this is the closest one found.',
};

export function fitStatusMessage(status: FitStatus): string {
  return FIT_STATUS_MESSAGES[status];
}
