import type { InterpretationBed, ReviewEvent } from '../../../server/contract/interpretations';

export const BED_ROLE_WORDS: Record<InterpretationBed['role'], string> = {
  cover: 'Cover',
  aquifer: 'Aquifer',
  aquitard: 'Aquitard',
  saline: 'Saline',
  basement: 'Basement',
  unknown: 'Not known',
};

export const CONFIDENCE_WORDS: Record<InterpretationBed['confidence'], string> = {
  'well-supported': 'Well supported',
  likely: 'Likely',
  possible: 'Possible',
  unstated: 'Not stated',
};

export const EVENT_WORDS: Record<ReviewEvent['kind'], string> = {
  submitted: 'submitted for review',
  withdrawn: 'withdrew from review',
  'changes-asked': 'asked for changes',
  accepted: 'accepted',
  superseded: 'accepted another in its place',
  commented: 'commented',
  edited: 'changed the text',
};

export const optionsOf = <Key extends string>(words: Record<Key, string>) =>
  (Object.keys(words) as Key[]).map((value) => ({ value, label: words[value] }));
