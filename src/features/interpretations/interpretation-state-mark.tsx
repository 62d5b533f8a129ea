import type { InterpretationState } from '../../../server/contract/interpretations';
import type { Tone } from '../../ui/badge';
import type { MarkShape } from '../../ui/mark-glyph';
import { StateMark } from '../../ui/state-mark';
import { STATE_WORDS } from './interpretation-words';

const LOOK: Record<InterpretationState, { shape: MarkShape; tone: Tone }> = {
  draft: { shape: 'half', tone: 'copper' },
  'in-review': { shape: 'most', tone: 'copper' },
  'changes-asked': { shape: 'cross', tone: 'rust' },
  accepted: { shape: 'full', tone: 'water' },
  superseded: { shape: 'empty', tone: 'neutral' },
};

export function InterpretationStateMark({ state }: { state: InterpretationState }) {
  return <StateMark {...LOOK[state]} label={STATE_WORDS[state]} />;
}
