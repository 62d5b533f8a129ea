import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { messageOf } from '../../api/api-error';
import { useSignOut } from '../../api/session-mutations';
import { QueryView } from '../../app/query-view';
import { Badge } from '../../ui/badge';
import { Button } from '../../ui/button';
import { ConfirmDialog } from '../../ui/confirm-dialog';
import { formatMoment } from '../../ui/format';
import { Notice } from '../../ui/notice';
import { deviceName } from './device-name';
import { useSignOutEverywhere } from './account-mutations';
import { sessionListQuery } from './account-queries';

export function SessionList() {
  const sessions = useQuery(sessionListQuery);
  const signOut = useSignOut();
  const everywhere = useSignOutEverywhere();
  const [asking, setAsking] = useState(false);
  const fault = signOut.error ?? everywhere.error;
  return (
    <div className="flex flex-col gap-4">
      {fault ? <Notice tone="fault">{messageOf(fault)}</Notice> : null}
      <QueryView query={sessions} loadingLabel="Loading sessions" loadingLines={3}>
        {({ items }) => (
          <ul className="border-y border-rule">
            {items.map((session) => (
              <li
                key={session.handle}
                className="flex flex-wrap items-center gap-x-3 border-b border-rule py-2 last:border-b-0"
              >
                <span className="min-w-0 flex-1 truncate" title={session.userAgent}>
                  {deviceName(session.userAgent)}
                </span>
                {session.current ? <Badge tone="water">this one</Badge> : null}
                <span className="figure text-sm text-muted">since {formatMoment(session.createdAt)}</span>
              </li>
            ))}
          </ul>
        )}
      </QueryView>
      <div className="flex flex-wrap gap-2">
        <Button loading={signOut.isPending} onClick={() => signOut.mutate()}>
          Sign out here
        </Button>
        <Button kind="danger" onClick={() => setAsking(true)}>
          Sign out everywhere
        </Button>
      </div>
      <ConfirmDialog
        open={asking}
        onOpenChange={setAsking}
        title="Sign out everywhere?"
        description="Every session of this account ends, this one too. Drafts on the server stay."
        confirmLabel="Sign out everywhere"
        danger
        working={everywhere.isPending}
        onConfirm={() => everywhere.mutate(undefined, { onError: () => setAsking(false) })}
      />
    </div>
  );
}
