import type { SoundingState } from '../../server/contract/soundings';
import { StateMark } from '../ui/state-mark';
import { SOUNDING_STATE_LOOK } from './sounding-state-look';

/** How far a sounding has come. */
export function SoundingStateMark({ state }: { state: SoundingState }) {
  return <StateMark {...SOUNDING_STATE_LOOK[state]} />;
}
