import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { Survey } from '../../../server/contract/surveys';
import { boreholeListQuery } from '../../api/survey-queries';
import { addressOf } from '../../app/addresses';
import { QueryView } from '../../app/query-view';
import { formatCount } from '../../ui/format';
import { StateMark } from '../../ui/state-mark';
import { EmptyState } from '../../ui/view-states';
import { allSoundingsQuery } from './all-soundings-query';
import { planCounts, planItems, type PlanItem } from './plan-items';
import { SurveyPlan } from './survey-plan';

/** Where the soundings and boreholes stand, coloured by how far they have come. */
export function SurveyMap({ survey }: { survey: Survey }) {
  const soundings = useQuery(allSoundingsQuery(survey.id));
  const boreholes = useQuery(boreholeListQuery(survey.id));
  const rows = soundings.data?.items;
  const holes = boreholes.data?.items;
  const { items, unplaced } = useMemo(
    () => planItems(survey.id, rows ?? [], holes ?? []),
    [survey.id, rows, holes],
  );
  const upward = survey.epsgCode === null ? 'y' : 'north';
  return (
    <section aria-label="Plan" className="min-w-0">
      <QueryView query={soundings} loadingLabel="Loading the plan" loadingLines={10}>
        {({ items: shown, total }) =>
          items.length === 0 ? (
            <NoPositions survey={survey} hasSoundings={total > 0} />
          ) : (
            <>
              <SurveyPlan items={items} upward={upward} />
              <PlanLegend items={items} surveyId={survey.id} />
              <p className="mt-2 text-sm text-muted">
                {unplaced > 0 ? `${formatCount(unplaced, 'place')} without x and y not drawn. ` : ''}
                {shown.length < total ? `The first ${shown.length} of ${total} soundings are drawn. ` : ''}
                {boreholes.error ? `Boreholes are not drawn: ${boreholes.error.message}` : ''}
              </p>
            </>
          )
        }
      </QueryView>
    </section>
  );
}

function NoPositions({ survey, hasSoundings }: { survey: Survey; hasSoundings: boolean }) {
  const to = addressOf('surveySoundings', { surveyId: survey.id });
  return hasSoundings ? (
    <EmptyState title="No positions yet" actions={<Link to={to}>To the soundings</Link>}>
      The plan is drawn from x and y of the soundings; give them under “Details” on a Field sheet.
    </EmptyState>
  ) : (
    <EmptyState title="No soundings yet" actions={<Link to={to}>To the soundings</Link>}>
      {survey.can.editSoundings
        ? 'Add the first sounding; it appears on the plan when it has x and y.'
        : 'A lead or a geophysicist of the survey adds soundings.'}
    </EmptyState>
  );
}

function PlanLegend({ items, surveyId }: { items: readonly PlanItem[]; surveyId: string }) {
  const holes = items.filter((item) => item.kind === 'borehole').length;
  const list = addressOf('surveySoundings', { surveyId });
  return (
    <ul className="mt-2 flex flex-wrap items-center gap-x-5 gap-y-1 text-sm">
      <li className="text-muted">Each counted once, by how far it is now:</li>
      {planCounts(items).map(({ state, look, count }) => (
        <li key={look.label}>
          <Link
            to={`${list}?state=${state}`}
            className="inline-flex min-h-6 items-center gap-1.5 no-underline"
          >
            <StateMark {...look} /> <span className="figure text-muted">{count}</span>
          </Link>
        </li>
      ))}
      {holes > 0 ? (
        <li>
          <Link
            to={addressOf('surveyBoreholes', { surveyId })}
            className="inline-flex min-h-6 items-center gap-1.5 no-underline"
          >
            <svg aria-hidden width="12" height="12" viewBox="0 0 12 12">
              <path d="M1 1h10v10H1z" className="fill-none stroke-ink" strokeWidth="1.5" />
            </svg>
            Borehole <span className="figure text-muted">{holes}</span>
          </Link>
        </li>
      ) : null}
    </ul>
  );
}
