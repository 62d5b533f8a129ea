import type { SoundingState } from '../../server/contract/soundings';

export const SOUNDING_STATE_LABELS: Record<SoundingState, string> = {
  'no-readings': 'No readings',
  measured: 'Measured',
  fitted: 'Fitted',
  draft: 'Interpretation in draft',
  'in-review': 'In review',
  'changes-asked': 'Changes asked',
  accepted: 'Accepted',
};
