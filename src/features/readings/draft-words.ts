import { format } from 'date-fns';
import type { DraftState } from './draft-keeper';

/** The state of the draft in a few words, for the head of the page. */
export function draftWords(state: DraftState, revisionNumber: number | null): string {
  const saved = revisionNumber === null ? 'no readings saved' : `readings revision ${revisionNumber}`;
  switch (state.kind) {
    case 'none':
      return saved;
    case 'waiting':
    case 'sending':
      return `${saved}, draft not sent yet`;
    case 'kept':
      return `${saved}, draft kept ${format(state.at, 'HH:mm')}`;
    case 'unsent':
      return `${saved}, draft not sent yet (kept on this device)`;
  }
}
