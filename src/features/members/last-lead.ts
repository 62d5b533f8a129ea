import type { Role } from '../../../server/contract/roles';

interface Holder {
  user: { id: string };
  role: Role;
}

/** Whether the survey would be without a lead if this member were none. */
export const isLastLead = (member: Holder, members: readonly Holder[]): boolean =>
  member.role === 'lead' && members.every(({ user, role }) => role !== 'lead' || user.id === member.user.id);
