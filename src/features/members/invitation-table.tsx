import { useQuery } from '@tanstack/react-query';
import { messageOf } from '../../api/api-error';
import { QueryView } from '../../app/query-view';
import { Button } from '../../ui/button';
import { formatDay } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { ROLE_LABELS } from '../../ui/role-words';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { useRevokeInvitation } from './member-mutations';
import { invitationListQuery } from './member-queries';

const STATE_WORDS = { open: 'open', accepted: 'accepted', revoked: 'withdrawn', expired: 'run out' };

export function InvitationTable({ surveyId }: { surveyId: string }) {
  const invitations = useQuery(invitationListQuery(surveyId));
  const revoke = useRevokeInvitation(surveyId);
  return (
    <section aria-label="Invitations">
      <h2 className="mb-2 text-lg font-semibold">Invitations</h2>
      {revoke.error ? <Notice tone="fault">{messageOf(revoke.error)}</Notice> : null}
      <QueryView query={invitations} loadingLabel="Loading invitations" loadingLines={3}>
        {({ items }) =>
          items.length === 0 ? (
            <p className="text-muted">None. An invitation goes out by mail and holds for 14 days.</p>
          ) : (
            <Table caption="Invitations">
              <TableHead>
                <HeaderCell>E-mail address</HeaderCell>
                <HeaderCell>Role</HeaderCell>
                <HeaderCell className="hidden md:table-cell">Invited by</HeaderCell>
                <HeaderCell className="hidden sm:table-cell">Holds until</HeaderCell>
                <HeaderCell>State</HeaderCell>
                <HeaderCell>
                  <span className="sr-only">Actions</span>
                </HeaderCell>
              </TableHead>
              <TableBody>
                {items.map((invitation) => (
                  <TableRow key={invitation.id}>
                    <Cell className="wrap-anywhere">{invitation.email}</Cell>
                    <Cell>{ROLE_LABELS[invitation.role]}</Cell>
                    <Cell className="hidden md:table-cell">{invitation.invitedBy.name}</Cell>
                    <Cell className="figure hidden whitespace-nowrap sm:table-cell">
                      {formatDay(invitation.expiresAt)}
                    </Cell>
                    <Cell>{STATE_WORDS[invitation.state]}</Cell>
                    <Cell className="text-right">
                      {invitation.state === 'open' ? (
                        <Button
                          size="small"
                          kind="quiet"
                          aria-label={`Withdraw the invitation of ${invitation.email}`}
                          loading={revoke.isPending && revoke.variables === invitation.id}
                          onClick={() => revoke.mutate(invitation.id)}
                        >
                          Withdraw
                        </Button>
                      ) : null}
                    </Cell>
                  </TableRow>
                ))}
              </TableBody>
            </Table>
          )
        }
      </QueryView>
    </section>
  );
}
