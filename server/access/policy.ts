import type { Role, SurveyCan } from '../contract/roles';

export type SurveyAction = keyof SurveyCan;

const GEOPHYSICIST: readonly SurveyAction[] = [
  'editSoundings',
  'editReadings',
  'run',
  'recompute',
  'annotateRuns',
  'interpret',
  'submit',
  'comment',
];

/** What each role does in a survey; reading is open to every member. The one table of rights. */
export const ROLE_ACTIONS: Record<Role, readonly SurveyAction[]> = {
  lead: [...GEOPHYSICIST, 'editSurvey', 'manageMembers'],
  geophysicist: GEOPHYSICIST,
  hydrogeologist: ['editBoreholes', 'comment', 'decide'],
  analyst: ['recompute', 'annotateRuns', 'interpret'],
  guest: [],
};

const ALL_ACTIONS = [...new Set(Object.values(ROLE_ACTIONS).flat())] as readonly SurveyAction[];

export const may = (role: Role, action: SurveyAction): boolean => ROLE_ACTIONS[role].includes(action);

/** The `can` object of a survey and of all that belongs to it. */
export function surveyCan(role: Role): SurveyCan {
  return Object.fromEntries(ALL_ACTIONS.map((action) => [action, may(role, action)])) as Record<
    SurveyAction,
    boolean
  >;
}
