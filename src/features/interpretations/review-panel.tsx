import { useState } from 'react';
import type { Interpretation } from '../../../server/contract/interpretations';
import { Button } from '../../ui/button';
import { Notice } from '../../ui/notice';
import { DiscardDraft } from './discard-draft';
import { ReviewDialog, type ReviewMove } from './review-dialog';

export interface ReviewPanelProps {
  interpretation: Interpretation;
  isDirty: boolean;
}

const STATE_SENTENCES: Record<Interpretation['state'], string> = {
  draft: 'Not yet submitted.',
  'in-review': 'Waits for a hydrogeologist of the survey to accept it or to ask for changes.',
  'changes-asked': 'A hydrogeologist asked for changes; see the history.',
  accepted: 'Accepted. It stands until another interpretation of this sounding is accepted.',
  superseded: 'Another interpretation of this sounding was accepted after it.',
};

/** Where the interpretation stands, and the moves this reader may make. */
export function ReviewPanel({ interpretation, isDirty }: ReviewPanelProps) {
  const [move, setMove] = useState<ReviewMove | null>(null);
  const { can, state, decideRefusal } = interpretation;
  return (
    <section aria-labelledby="review-title" className="flex flex-col gap-3">
      <h2 id="review-title" className="font-semibold">
        Review
      </h2>
      <p>{STATE_SENTENCES[state]}</p>
      {decideRefusal === null ? null : <Notice>{decideRefusal}</Notice>}
      <div className="flex flex-wrap gap-2 empty:hidden print:hidden">
        {can.decide ? (
          <>
            <Button kind="main" onClick={() => setMove('accepted')}>
              Accept
            </Button>
            <Button onClick={() => setMove('changes-asked')}>Ask for changes</Button>
          </>
        ) : null}
        {can.submit ? (
          <Button kind={isDirty ? 'plain' : 'main'} disabled={isDirty} onClick={() => setMove('submitted')}>
            Submit for review
          </Button>
        ) : null}
        {can.withdraw ? <Button onClick={() => setMove('withdrawn')}>Withdraw</Button> : null}
        {can.discard ? <DiscardDraft interpretation={interpretation} /> : null}
      </div>
      {can.edit && !can.submit ? (
        <p className="text-sm text-muted print:hidden">
          A lead or a geophysicist of the survey submits it for review.
        </p>
      ) : null}
      {can.submit && isDirty ? (
        <p className="text-sm text-muted">Save your changes before you submit.</p>
      ) : null}
      <p className="text-sm text-muted">
        A resistivity model is not proof of water, of its quantity or of its quality. A drilling, supply,
        earthing or contamination decision needs a licensed practitioner, local regulations and a test on the
        ground.
      </p>
      {move ? (
        <ReviewDialog interpretation={interpretation} move={move} onClose={() => setMove(null)} />
      ) : null}
    </section>
  );
}
