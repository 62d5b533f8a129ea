import { useRouteError } from 'react-router-dom';
import { ErrorState } from '../ui/view-states';
import { PageFrame } from './page-frame';

/** A page that failed to load or to draw; the frame stays so that the reader can go elsewhere. */
export function RouteError() {
  const thrown = useRouteError();
  const message = thrown instanceof Error ? thrown.message : 'Something unexpected happened.';
  const isStalePart = /dynamically imported module|module script failed/i.test(message);
  return (
    <PageFrame title="Fault">
      <ErrorState
        title={isStalePart ? 'This page could not be fetched' : 'This page failed'}
        message={
          isStalePart
            ? 'The connection was lost or a newer version was installed. Nothing saved is lost.'
            : message
        }
        onRetry={() => window.location.reload()}
      />
    </PageFrame>
  );
}
