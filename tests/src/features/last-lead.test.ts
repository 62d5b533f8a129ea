import { expect, it } from 'vitest';
import type { Role } from '../../../server/contract/roles';
import { isLastLead } from '../../../src/features/members/last-lead';

const member = (id: string, role: Role) => ({ user: { id }, role });

it('knows the one lead of a survey, whom nobody is asked to remove', () => {
  const [ana, bram, cela] = [member('a', 'lead'), member('b', 'geophysicist'), member('c', 'lead')];
  expect(isLastLead(ana, [ana, bram])).toBe(true);
  expect(isLastLead(bram, [ana, bram])).toBe(false);
  expect(isLastLead(ana, [ana, bram, cela])).toBe(false);
});
