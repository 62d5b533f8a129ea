import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { signInAddress } from '../api/return-address';
import { useSignOut } from '../api/session-mutations';
import { meQuery } from '../api/session-queries';
import { MeContext } from '../api/use-me';
import { showToast } from '../ui/show-toast';
import { FrameAccountContext, type FrameAccount } from './frame-account';
import { LoadingPage } from './loading-page';
import { PageFrame } from './page-frame';
import { QueryView } from './query-view';

/** Stands before every page that needs someone to be signed in, and leads back after signing in. */
export function RequireSession() {
  const me = useQuery(meQuery);
  const { pathname, search } = useLocation();
  const { mutate: signOut } = useSignOut();
  const account = useMemo<FrameAccount | null>(
    () =>
      me.data
        ? {
            displayName: me.data.name,
            email: me.data.email,
            isAdmin: me.data.can.administer,
            onSignOut: () =>
              signOut(undefined, {
                onError: (error) =>
                  showToast({ title: 'Not signed out', description: error.message, kind: 'bad' }),
              }),
          }
        : null,
    [me.data, signOut],
  );
  if (me.data === null) return <Navigate to={signInAddress(pathname + search)} replace />;
  if (me.isPending) return <LoadingPage />;
  if (me.data === undefined)
    return (
      <PageFrame title="Not reached">
        <QueryView query={me} loadingLabel="Loading your account">
          {() => null}
        </QueryView>
      </PageFrame>
    );
  return (
    <MeContext value={me.data}>
      <FrameAccountContext value={account}>
        <Outlet />
      </FrameAccountContext>
    </MeContext>
  );
}
