import type { InterpretationState } from '../../server/contract/interpretations';
import { SOUNDING_STATE_LOOK, type SoundingStateLook } from '../soundings/sounding-state-look';
import { StateMark } from '../ui/state-mark';

/** The look of a sounding that has come as far; a replaced interpretation marks none. */
function lookOf(state: InterpretationState): SoundingStateLook {
  return state === 'superseded'
    ? { label: 'Superseded', shape: 'empty', tone: 'neutral' }
    : SOUNDING_STATE_LOOK[state];
}

export function InterpretationStateMark({ state }: { state: InterpretationState }) {
  return <StateMark {...lookOf(state)} />;
}
