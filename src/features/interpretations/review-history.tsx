import { useForm } from 'react-hook-form';
import { createReviewEventSchema, type Interpretation } from '../../../server/contract/interpretations';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { formatMoment } from '../../ui/format';
import { Textarea } from '../../ui/textarea';
import { useReviewEvent, type ReviewEventInput } from './interpretation-mutations';
import { EVENT_WORDS } from './interpretation-words';

/** Everything that was done and said in the review, oldest first, and a place to say more. */
export function ReviewHistory({ interpretation }: { interpretation: Interpretation }) {
  return (
    <section aria-labelledby="history-title" className="flex flex-col gap-3">
      <h2 id="history-title" className="font-semibold">
        History
      </h2>
      <ol className="flex flex-col gap-3 border-l-2 border-rule pl-3">
        <li>
          <p className="text-sm text-muted">
            {interpretation.author.name} began it, {formatMoment(interpretation.createdAt)}
          </p>
        </li>
        {interpretation.events.map((event) => (
          <li key={event.id}>
            <p className="text-sm text-muted">
              <span className="text-ink">{event.actor.name}</span> {EVENT_WORDS[event.kind]},{' '}
              {formatMoment(event.at)}
            </p>
            {event.comment === '' ? null : <p className="whitespace-pre-wrap">{event.comment}</p>}
          </li>
        ))}
      </ol>
      {interpretation.can.comment ? <CommentForm interpretation={interpretation} /> : null}
    </section>
  );
}

function CommentForm({ interpretation }: { interpretation: Interpretation }) {
  const review = useReviewEvent(interpretation.id);
  const form = useForm<ReviewEventInput>({
    resolver: formResolver(createReviewEventSchema),
    defaultValues: { kind: 'commented', comment: '' },
  });
  const say = form.handleSubmit((event) => review.mutate(event, { onSuccess: () => form.reset() }));
  return (
    <form onSubmit={say} className="flex flex-col items-start gap-2 print:hidden" aria-label="Say something">
      <Field label="Comment" className="w-full" error={form.formState.errors.comment?.message}>
        <Textarea rows={3} {...form.register('comment')} />
      </Field>
      <FormErrors title="Not sent" faults={formFaults(review.error)} />
      <Button size="small" type="submit" loading={review.isPending}>
        Add comment
      </Button>
    </form>
  );
}
