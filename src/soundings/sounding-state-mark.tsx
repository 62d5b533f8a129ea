import type { SoundingState } from '../../server/contract/soundings';
import type { Tone } from '../ui/badge';
import { StateMark, type MarkShape } from '../ui/state-mark';
import { SOUNDING_STATE_LABELS } from './sounding-state-labels';

const LOOK: Record<SoundingState, { shape: MarkShape; tone: Tone }> = {
  'no-readings': { shape: 'empty', tone: 'neutral' },
  measured: { shape: 'part', tone: 'neutral' },
  fitted: { shape: 'half', tone: 'water' },
  draft: { shape: 'half', tone: 'copper' },
  'in-review': { shape: 'part', tone: 'copper' },
  'changes-asked': { shape: 'cross', tone: 'rust' },
  accepted: { shape: 'full', tone: 'water' },
};

/** How far a sounding has come. */
export function SoundingStateMark({ state }: { state: SoundingState }) {
  return <StateMark {...LOOK[state]} label={SOUNDING_STATE_LABELS[state]} />;
}
