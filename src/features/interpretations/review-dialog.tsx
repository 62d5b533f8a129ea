import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { createReviewEventSchema, type Interpretation } from '../../../server/contract/interpretations';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/checkbox';
import { Dialog } from '../../ui/dialog';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Notice } from '../../ui/notice';
import { Textarea } from '../../ui/textarea';
import { useReviewEvent, type ReviewEventInput } from './interpretation-mutations';
import { interpretationListQuery } from './interpretation-queries';
import { supersededWords } from './superseded-words';
import { unwrittenParts } from './unwritten-parts';

export type ReviewMove = 'submitted' | 'withdrawn' | 'changes-asked' | 'accepted';

interface MoveWords {
  title: string;
  description: string;
  comment: string;
  verb: string;
}

const WORDS: Record<ReviewMove, MoveWords> = {
  submitted: {
    title: 'Submit for review',
    description:
      'It is frozen as it stands and goes to the hydrogeologists of the survey. It cannot be edited until they decide or it is withdrawn.',
    comment: 'A word for the reviewer (may stay empty)',
    verb: 'Submit',
  },
  withdrawn: {
    title: 'Withdraw from review',
    description: 'It becomes a draft again and can be edited. What was submitted stays in the history.',
    comment: 'Why (may stay empty)',
    verb: 'Withdraw',
  },
  'changes-asked': {
    title: 'Ask for changes',
    description: 'It goes back to its author, who can edit and submit it again.',
    comment: 'What should change',
    verb: 'Ask for changes',
  },
  accepted: {
    title: 'Accept',
    description: 'It stands as the interpretation of this sounding and cannot be edited any more.',
    comment: 'A word for the record (may stay empty)',
    verb: 'Accept',
  },
};

export interface ReviewDialogProps {
  interpretation: Interpretation;
  move: ReviewMove;
  onClose: () => void;
}

/** One step of the review, with its consequence told before it is taken. */
export function ReviewDialog({ interpretation, move, onClose }: ReviewDialogProps) {
  const words = WORDS[move];
  const all = useQuery({
    ...interpretationListQuery(interpretation.soundingId),
    enabled: move === 'accepted',
  });
  const superseded = move === 'accepted' ? supersededWords(all.data?.items ?? []) : '';
  const review = useReviewEvent(interpretation.id);
  const form = useForm<ReviewEventInput>({
    resolver: formResolver(createReviewEventSchema),
    defaultValues: { kind: move, comment: '', version: interpretation.version },
  });
  const unwritten = move === 'submitted' ? unwrittenParts(interpretation) : [];
  const [isMeant, setIsMeant] = useState(false);
  const [isAskedTwice, setIsAskedTwice] = useState(false);
  const take = form.handleSubmit((event) => {
    if (unwritten.length > 0 && !isMeant) setIsAskedTwice(true);
    else review.mutate(event, { onSuccess: onClose });
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={words.title}
      description={`${words.description}${superseded}`}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button kind="main" loading={review.isPending} onClick={take}>
            {words.verb}
          </Button>
        </>
      }
    >
      <form onSubmit={take} className="flex flex-col gap-4">
        <FormErrors title="Not done" faults={formFaults(review.error, { comment: 'Comment' })} />
        <Field
          label={words.comment}
          required={move === 'changes-asked'}
          error={form.formState.errors.comment?.message}
        >
          <Textarea rows={4} {...form.register('comment')} />
        </Field>
        {unwritten.length > 0 ? (
          <UnwrittenNotice parts={unwritten} isMeant={isMeant} onMeant={setIsMeant} isAsked={isAskedTwice} />
        ) : null}
      </form>
    </Dialog>
  );
}

interface UnwrittenNoticeProps {
  parts: readonly string[];
  isMeant: boolean;
  onMeant: (isMeant: boolean) => void;
  /** It was to be sent without the tick: says what is needed. */
  isAsked: boolean;
}

/** Names what the reviewer would find empty, and asks once more whether that is meant. */
function UnwrittenNotice({ parts, isMeant, onMeant, isAsked }: UnwrittenNoticeProps) {
  const isMissing = isAsked && !isMeant;
  return (
    <Notice tone="caution" title={parts.join(' ')}>
      <Checkbox
        label="Submit it as it stands"
        checked={isMeant}
        aria-invalid={isMissing || undefined}
        onChange={(event) => onMeant(event.target.checked)}
      />
      {isMissing ? (
        <p role="alert" className="text-sm text-rust">
          Tick this to submit it so, or cancel and write what is missing.
        </p>
      ) : null}
    </Notice>
  );
}
