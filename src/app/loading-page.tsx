import { LoadingState } from '../ui/view-states';
import { PageFrame } from './page-frame';

export function LoadingPage() {
  return (
    <PageFrame title="Loading">
      <LoadingState label="Loading the page" />
    </PageFrame>
  );
}
