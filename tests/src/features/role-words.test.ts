import { expect, it } from 'vitest';
import { ROLE_ACTIONS, type SurveyAction } from '../../../server/access/policy';
import { ROLE_NAMES, roleSchema } from '../../../server/contract/roles';
import { detailsInWords } from '../../../src/features/admin/details-in-words';
import { supersededWords } from '../../../src/features/interpretations/superseded-words';
import { WHO_ASKS_FOR_RUNS, WHO_BEGINS_INTERPRETATIONS } from '../../../src/ui/role-words';

it.each<[SurveyAction, string]>([
  ['run', WHO_ASKS_FOR_RUNS],
  ['interpret', WHO_BEGINS_INTERPRETATIONS],
])('names for “%s” the roles that the table of rights gives it to', (action, words) => {
  const named = roleSchema.options.filter((role) => words.includes(` ${ROLE_NAMES[role]}`));
  expect(named).toEqual(roleSchema.options.filter((role) => ROLE_ACTIONS[role].includes(action)));
});

it('calls a role in the audit what it is called everywhere', () => {
  expect(detailsInWords({ from: 'guest', to: 'analyst' })).toBe('from guest; to archive analyst');
});

it('says what acceptance supersedes, and nothing where nothing was accepted', () => {
  const one = (state: 'accepted' | 'in-review', title: string) => ({ state, title });
  expect(supersededWords([one('in-review', 'Second')])).toBe('');
  expect(supersededWords([one('in-review', 'Second'), one('accepted', 'First')])).toBe(
    ' “First”, accepted before, is superseded.',
  );
});
