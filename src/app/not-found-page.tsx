import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/view-states';
import { addressOf } from './addresses';
import { PageFrame } from './page-frame';

export function NotFoundPage() {
  return (
    <PageFrame title="Not found">
      <EmptyState
        title="Nothing stands at this address"
        actions={<ButtonLink to={addressOf('surveys')}>To my surveys</ButtonLink>}
      >
        The address may be mistyped, or what stood here belongs to a survey you are not a member of.
      </EmptyState>
    </PageFrame>
  );
}
