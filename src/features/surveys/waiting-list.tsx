import { useQueries } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Survey } from '../../../server/contract/surveys';
import { messageOf } from '../../api/api-error';
import { soundingListQuery } from '../../api/sounding-queries';
import { addressOf } from '../../app/addresses';
import { SoundingStateMark } from '../../soundings/sounding-state-mark';
import { Notice } from '../../ui/notice';
import { Skeleton } from '../../ui/view-states';
import { waitingQuestions } from './waiting-questions';

const SHOWN_PER_SURVEY = 8;

/** What waits for the person signed in, over all surveys. */
export function WaitingList({ surveys }: { surveys: readonly Survey[] }) {
  const questions = waitingQuestions(surveys);
  const answers = useQueries({
    queries: questions.map(({ survey, state }) =>
      soundingListQuery(survey.id, { state, sort: 'updatedAt', order: 'desc', pageSize: SHOWN_PER_SURVEY }),
    ),
  });
  const waiting = questions
    .map((question, i) => ({ ...question, page: answers[i]?.data }))
    .filter(({ page }) => page !== undefined && page.total > 0);
  const fault = answers.find((answer) => answer.error !== null && answer.data === undefined)?.error;
  const isPending = answers.some((answer) => answer.isPending);
  return (
    <section aria-label="Waiting for you" className="border-t border-rule pt-4">
      <h2 className="mb-2 font-semibold">Waiting for you</h2>
      {fault ? <Notice tone="fault">{messageOf(fault)}</Notice> : null}
      {isPending ? <Skeleton className="w-3/4" /> : null}
      {!isPending && !fault && waiting.length === 0 ? (
        <p className="text-muted">Nothing at present.</p>
      ) : null}
      {waiting.map(({ survey, state, page }) => (
        <div key={`${survey.id} ${state}`} className="mb-4">
          <h3 className="flex items-baseline justify-between gap-3 text-sm">
            <span className="text-muted">{survey.name}</span>
            <SoundingStateMark state={state} />
          </h3>
          <ul className="mt-1">
            {page?.items.map((sounding) => (
              <li key={sounding.id}>
                <Link
                  to={addressOf('interpretations', { soundingId: sounding.id })}
                  className="flex min-h-7 items-center justify-between gap-3 touch:min-h-11"
                >
                  <span>{sounding.name}</span>
                  <span className="text-sm text-muted">{sounding.lineName}</span>
                </Link>
              </li>
            ))}
          </ul>
          {(page?.total ?? 0) > SHOWN_PER_SURVEY ? (
            <Link to={`${addressOf('surveySoundings', { surveyId: survey.id })}?state=${state}`}>
              All {page?.total}
            </Link>
          ) : null}
        </div>
      ))}
    </section>
  );
}
