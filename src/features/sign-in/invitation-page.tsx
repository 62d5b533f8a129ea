import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { hasCode } from '../../api/api-error';
import { addressOf } from '../../app/addresses';
import { QueryView } from '../../app/query-view';
import { ButtonLink } from '../../ui/button';
import { Notice } from '../../ui/notice';
import { EntryFrame } from './entry-frame';
import { InvitationForm } from './invitation-form';
import { invitationOfferQuery } from './invitation-queries';

export function InvitationPage() {
  const { token = '' } = useParams();
  const offer = useQuery(invitationOfferQuery(token));
  if (hasCode(offer.error, 'not-found'))
    return (
      <EntryFrame title="Invitation">
        <Notice tone="caution" title="This invitation no longer holds">
          It was accepted already, withdrawn, or has run out. Ask whoever invited you for a new one.
        </Notice>
        <ButtonLink to={addressOf('signIn')} className="self-start">
          Sign in
        </ButtonLink>
      </EntryFrame>
    );
  return (
    <EntryFrame title="Invitation">
      <QueryView query={offer} loadingLabel="Loading the invitation" loadingLines={4}>
        {(data) => <InvitationForm token={token} offer={data} />}
      </QueryView>
    </EntryFrame>
  );
}
