import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Interpretation } from '../../../server/contract/interpretations';
import { messageOf } from '../../api/api-error';
import { addressOf } from '../../app/addresses';
import { Button } from '../../ui/button';
import { ConfirmDialog } from '../../ui/confirm-dialog';
import { Notice } from '../../ui/notice';
import { showToast } from '../../ui/show-toast';
import { useDiscardInterpretation } from './interpretation-mutations';

/** Said with the way out of a draft that is gone: there is nothing left to be asked about. */
export const DISCARDED = 'draft discarded';

/** Throws a draft away that was never submitted, after asking. */
export function DiscardDraft({ interpretation }: { interpretation: Interpretation }) {
  const [isAsking, setIsAsking] = useState(false);
  const navigate = useNavigate();
  const { soundingId, title } = interpretation;
  const discard = useDiscardInterpretation(interpretation);
  const throwAway = () =>
    discard.mutate(undefined, {
      onSuccess: () => {
        showToast({ kind: 'good', title: 'Draft discarded' });
        void navigate(addressOf('interpretations', { soundingId }), { replace: true, state: DISCARDED });
      },
    });
  return (
    <>
      <Button
        onClick={() => {
          discard.reset();
          setIsAsking(true);
        }}
      >
        Discard the draft
      </Button>
      <ConfirmDialog
        open={isAsking}
        onOpenChange={setIsAsking}
        title="Discard the draft"
        description={`“${title}” was never submitted. Discarding deletes it for good; the run it stands on stays.`}
        confirmLabel="Discard"
        danger
        working={discard.isPending}
        onConfirm={throwAway}
      >
        {discard.error ? (
          <Notice tone="fault" title="Not discarded">
            {messageOf(discard.error)}
          </Notice>
        ) : null}
      </ConfirmDialog>
    </>
  );
}
