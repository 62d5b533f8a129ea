import type { SoundingRow, SoundingState } from '../../server/contract/soundings';
import { isRejected } from '../runs/rejected-fit';
import type { Tone } from '../ui/badge';
import type { MarkShape } from '../ui/mark-glyph';

export interface SoundingStateLook {
  label: string;
  shape: MarkShape;
  tone: Tone;
}

/** How far a sounding has come, in words and as a mark; from the first step to the last. */
export const SOUNDING_STATE_LOOK: Record<SoundingState, SoundingStateLook> = {
  'no-readings': { label: 'No readings', shape: 'empty', tone: 'neutral' },
  measured: { label: 'Measured', shape: 'part', tone: 'neutral' },
  fitted: { label: 'Fitted', shape: 'half', tone: 'water' },
  draft: { label: 'In draft', shape: 'half', tone: 'copper' },
  'in-review': { label: 'In review', shape: 'most', tone: 'copper' },
  'changes-asked': { label: 'Changes asked', shape: 'cross', tone: 'rust' },
  accepted: { label: 'Accepted', shape: 'full', tone: 'water' },
};

export const SOUNDING_STATES = Object.keys(SOUNDING_STATE_LOOK) as SoundingState[];

/** Of a sounding that is fitted by a run which the readings reject: nothing can follow from that. */
const REJECTED_FIT_LOOK: SoundingStateLook = {
  label: 'Fit does not explain the readings',
  shape: 'bar',
  tone: 'rust',
};

/** The mark of one sounding, by the run that stands for it too. */
export const lookOf = ({ state, latestRun }: Pick<SoundingRow, 'state' | 'latestRun'>): SoundingStateLook =>
  state === 'fitted' && isRejected(latestRun) ? REJECTED_FIT_LOOK : SOUNDING_STATE_LOOK[state];
