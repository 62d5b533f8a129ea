import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import type { adminUserSchema } from '../../../server/contract/admin';
import { messageOf } from '../../api/api-error';
import { useMe } from '../../api/use-me';
import { QueryView } from '../../app/query-view';
import { Badge } from '../../ui/badge';
import { Button } from '../../ui/button';
import { classNames } from '../../ui/class-names';
import { ConfirmDialog } from '../../ui/confirm-dialog';
import { formatDay } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import { useSetUserState } from './admin-mutations';
import { adminUsersQuery } from './admin-queries';

type AdminUser = z.output<typeof adminUserSchema>;

export function UserTable() {
  const me = useMe();
  const users = useQuery(adminUsersQuery);
  const setState = useSetUserState();
  const [asking, setAsking] = useState<AdminUser | null>(null);
  return (
    <>
      {setState.error ? (
        <Notice tone="fault" title="Not changed">
          {messageOf(setState.error)}
        </Notice>
      ) : null}
      <QueryView query={users} loadingLabel="Loading people">
        {({ items }) => (
          <Table caption="People">
            <TableHead>
              <HeaderCell>Name</HeaderCell>
              <HeaderCell className="hidden sm:table-cell">E-mail address</HeaderCell>
              <HeaderCell className="hidden md:table-cell" numeric>
                Surveys
              </HeaderCell>
              <HeaderCell className="hidden md:table-cell">Since</HeaderCell>
              <HeaderCell>State</HeaderCell>
              <HeaderCell>
                <span className="sr-only">Actions</span>
              </HeaderCell>
            </TableHead>
            <TableBody>
              {items.map((user) => (
                <TableRow key={user.id} className={classNames('h-9.25', user.disabledAt && 'text-muted')}>
                  <Cell>
                    <span className="font-semibold">{user.name}</span>{' '}
                    {user.isAdmin ? <Badge>admin</Badge> : null}
                  </Cell>
                  <Cell className="hidden sm:table-cell">{user.email}</Cell>
                  <Cell className="hidden md:table-cell" numeric>
                    {user.surveys}
                  </Cell>
                  <Cell className="figure hidden whitespace-nowrap md:table-cell">
                    {formatDay(user.createdAt)}
                  </Cell>
                  <Cell>
                    {user.disabledAt ? (
                      <Badge tone="rust">disabled {formatDay(user.disabledAt)}</Badge>
                    ) : (
                      'active'
                    )}
                  </Cell>
                  <Cell className="text-right">
                    {user.id === me.id ? null : (
                      <StateButton user={user} setState={setState} onAsk={() => setAsking(user)} />
                    )}
                  </Cell>
                </TableRow>
              ))}
            </TableBody>
          </Table>
        )}
      </QueryView>
      <ConfirmDialog
        open={asking !== null}
        onOpenChange={(open) => !open && setAsking(null)}
        title={`Disable the account of ${asking?.name ?? ''}?`}
        description="Their sessions end at once and they can no longer sign in. What they wrote stays. The account can be enabled again."
        confirmLabel="Disable the account"
        danger
        working={setState.isPending}
        onConfirm={() =>
          asking &&
          setState.mutate({ userId: asking.id, disabled: true }, { onSettled: () => setAsking(null) })
        }
      />
    </>
  );
}

interface StateButtonProps {
  user: AdminUser;
  setState: ReturnType<typeof useSetUserState>;
  onAsk: () => void;
}

function StateButton({ user, setState, onAsk }: StateButtonProps) {
  return user.disabledAt ? (
    <Button
      size="small"
      kind="quiet"
      aria-label={`Enable the account of ${user.name}`}
      loading={setState.isPending && setState.variables.userId === user.id}
      onClick={() => setState.mutate({ userId: user.id, disabled: false })}
    >
      Enable
    </Button>
  ) : (
    <Button size="small" kind="quiet" aria-label={`Disable the account of ${user.name}`} onClick={onAsk}>
      Disable
    </Button>
  );
}
