import type { Survey } from '../../../server/contract/surveys';

const STEPS = [
  ['soundings', 'soundings'],
  ['measured', 'with readings'],
  ['fitted', 'with a fit'],
  ['interpreted', 'interpretation begun'],
  ['accepted', 'accepted'],
] as const;

export interface ProgressStep {
  key: (typeof STEPS)[number][0];
  label: string;
  count: number;
  /** Of all soundings, 0 to 1. */
  share: number;
}

/** The way of a survey from its soundings to accepted interpretations; a step counts those beyond it too. */
export const progressSteps = (progress: Survey['progress']): ProgressStep[] =>
  STEPS.map(([key, label]) => ({
    key,
    label,
    count: progress[key],
    share: progress.soundings === 0 ? 0 : Math.min(1, progress[key] / progress.soundings),
  }));
