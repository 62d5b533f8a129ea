import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { ApiError, hasCode } from '../api/api-error';
import { soundingQuery } from '../api/sounding-queries';
import { addressOf } from '../app/addresses';
import { NotFoundPage } from '../app/not-found-page';
import { PageFrame, type PageFrameProps } from '../app/page-frame';
import { soundingSections } from '../app/section-links';
import { tickedRuns, useTickedRuns } from '../runs/ticked-runs';
import type { Sounding } from '../../server/contract/soundings';
import type { Crumb } from '../ui/breadcrumb';
import { ErrorState, LoadingState, NoPermissionState } from '../ui/view-states';

export interface SoundingPageProps extends Pick<PageFrameProps, 'layout'> {
  /** What the page is, as "Bench". */
  section: string;
  status?: (sounding: Sounding) => ReactNode;
  /** Keys of this page that the reader can use. */
  keys?: (sounding: Sounding) => ReactNode;
  children: (sounding: Sounding) => ReactNode;
}

function crumbsOf(sounding: Sounding): Crumb[] {
  return [
    { label: sounding.surveyName, to: addressOf('survey', { surveyId: sounding.surveyId }) },
    {
      label: sounding.lineName ?? 'soundings',
      to: addressOf('surveySoundings', { surveyId: sounding.surveyId }),
    },
    { label: sounding.name },
  ];
}

/** The frame of every page of one sounding, with the states before the sounding is there. */
export function SoundingPage({ section, status, keys, children, ...frame }: SoundingPageProps) {
  const { soundingId = '' } = useParams();
  const sounding = useQuery(soundingQuery(soundingId));
  const ticked = useTickedRuns((store) => tickedRuns(store, soundingId));
  const nav = soundingSections(soundingId, ticked);
  if (hasCode(sounding.error, 'not-found') || hasCode(sounding.error, 'bad-request')) return <NotFoundPage />;
  if (!sounding.data)
    return (
      <PageFrame title={section} nav={nav} navLabel="Sections of the sounding">
        <PageWait
          error={sounding.error}
          label="Loading the sounding"
          onRetry={() => void sounding.refetch()}
        />
      </PageFrame>
    );
  return (
    <PageFrame
      {...frame}
      title={`${sounding.data.name}, ${section}`}
      crumbs={crumbsOf(sounding.data)}
      nav={nav}
      navLabel="Sections of the sounding"
      status={status?.(sounding.data)}
      keys={keys?.(sounding.data)}
    >
      {children(sounding.data)}
    </PageFrame>
  );
}

export interface PageWaitProps {
  error: Error | null;
  /** What is being fetched, as "Loading the runs". */
  label: string;
  onRetry: () => void;
}

/** What stands where data are still to come, or did not. */
export function PageWait({ error, label, onRetry }: PageWaitProps) {
  if (error === null) return <LoadingState label={label} />;
  if (hasCode(error, 'forbidden')) return <NoPermissionState />;
  return (
    <ErrorState
      message={error.message}
      {...(error instanceof ApiError ? { code: error.code } : {})}
      onRetry={onRetry}
    />
  );
}
