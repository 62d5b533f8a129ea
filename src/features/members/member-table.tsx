import { useState } from 'react';
import type { z } from 'zod';
import { KEEP_A_LEAD, ROLE_NAMES, roleSchema, type Role } from '../../../server/contract/roles';
import type { memberSchema, Survey } from '../../../server/contract/surveys';
import { messageOf } from '../../api/api-error';
import { useMe } from '../../api/use-me';
import { Badge } from '../../ui/badge';
import { Button } from '../../ui/button';
import { ConfirmDialog } from '../../ui/confirm-dialog';
import { formatDay } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { ROLE_LABELS } from '../../ui/role-words';
import { Select } from '../../ui/select';
import { showToast } from '../../ui/show-toast';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { isLastLead } from './last-lead';
import { useRemoveMember, useSetRole } from './member-mutations';

type Member = z.output<typeof memberSchema>;

interface MemberTableProps {
  survey: Survey;
  members: readonly Member[];
}

export function MemberTable({ survey, members }: MemberTableProps) {
  const me = useMe();
  const setRole = useSetRole(survey.id);
  const remove = useRemoveMember(survey.id);
  const [leaving, setLeaving] = useState<Member | null>(null);
  const [isRefused, setIsRefused] = useState(false);
  const error = setRole.error ?? remove.error;
  const fault = isRefused ? KEEP_A_LEAD : error && messageOf(error);
  const askToRemove = (member: Member) => {
    const isLast = isLastLead(member, members);
    setIsRefused(isLast);
    if (!isLast) setLeaving(member);
  };
  const mayManage = survey.can.manageMembers;
  return (
    <div className="flex flex-col gap-3">
      {fault ? (
        <Notice tone="fault" title="Not changed">
          {fault}
        </Notice>
      ) : null}
      <Table caption="Members">
        <TableHead>
          <HeaderCell>Name</HeaderCell>
          <HeaderCell className="hidden sm:table-cell">E-mail address</HeaderCell>
          <HeaderCell>Role</HeaderCell>
          <HeaderCell className="hidden md:table-cell">Since</HeaderCell>
          {mayManage ? (
            <HeaderCell>
              <span className="sr-only">Actions</span>
            </HeaderCell>
          ) : null}
        </TableHead>
        <TableBody>
          {members.map((member) => (
            <TableRow key={member.user.id}>
              <Cell>
                <span className="font-semibold">{member.user.name}</span>{' '}
                {member.user.id === me.id ? <Badge>you</Badge> : null}
              </Cell>
              <Cell className="hidden sm:table-cell">{member.user.email}</Cell>
              <Cell>
                {mayManage ? (
                  <RoleSelect
                    member={member}
                    disabled={setRole.isPending}
                    onChoose={(role) => {
                      setIsRefused(false);
                      setRole.mutate(
                        { userId: member.user.id, role },
                        {
                          onSuccess: () =>
                            showToast({
                              title: `${member.user.name} is now ${ROLE_NAMES[role]}`,
                              kind: 'good',
                            }),
                        },
                      );
                    }}
                  />
                ) : (
                  ROLE_LABELS[member.role]
                )}
              </Cell>
              <Cell className="figure hidden whitespace-nowrap md:table-cell">
                {formatDay(member.joinedAt)}
              </Cell>
              {mayManage ? (
                <Cell className="text-right">
                  <Button
                    size="small"
                    kind="quiet"
                    aria-label={`Remove ${member.user.name}`}
                    onClick={() => askToRemove(member)}
                  >
                    Remove
                  </Button>
                </Cell>
              ) : null}
            </TableRow>
          ))}
        </TableBody>
      </Table>
      <ConfirmDialog
        open={leaving !== null}
        onOpenChange={(open) => !open && setLeaving(null)}
        title={`Remove ${leaving?.user.name ?? ''}?`}
        description="They no longer see this survey. What they measured, ran and wrote stays under their name."
        confirmLabel="Remove from the survey"
        danger
        working={remove.isPending}
        onConfirm={() => leaving && remove.mutate(leaving.user.id, { onSettled: () => setLeaving(null) })}
      />
    </div>
  );
}

interface RoleSelectProps {
  member: Member;
  disabled: boolean;
  onChoose: (role: Role) => void;
}

function RoleSelect({ member, disabled, onChoose }: RoleSelectProps) {
  return (
    <Select
      aria-label={`Role of ${member.user.name}`}
      className="min-w-36"
      options={roleSchema.options.map((value) => ({ value, label: ROLE_LABELS[value] }))}
      value={member.role}
      disabled={disabled}
      onChange={(event) => onChoose(roleSchema.parse(event.target.value))}
    />
  );
}
