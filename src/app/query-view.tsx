import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ApiError, hasCode, messageOf } from '../api/api-error';
import { EmptyState, ErrorState, LoadingState, NoPermissionState } from '../ui/view-states';

export interface QueryViewProps<T> {
  query: UseQueryResult<T>;
  /** What is being fetched, as "Loading soundings". */
  loadingLabel: string;
  loadingLines?: number;
  /** What is missing when the answer is "not found", as "This sounding". */
  what?: string;
  children: (data: T) => ReactNode;
}

/** What was fetched, or one of the states before and instead of it. Data once shown stay through a failed refresh. */
export function QueryView<T>(props: QueryViewProps<T>) {
  const { query, loadingLabel, loadingLines, what = 'This', children } = props;
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (query.error === null) return <LoadingState label={loadingLabel} lines={loadingLines ?? 6} />;
  return <QueryFault error={query.error} what={what} onRetry={() => void query.refetch()} />;
}

interface QueryFaultProps {
  error: Error;
  what: string;
  onRetry: () => void;
}

function QueryFault({ error, what, onRetry }: QueryFaultProps) {
  if (hasCode(error, 'forbidden')) return <NoPermissionState>{error.message}</NoPermissionState>;
  if (hasCode(error, 'not-found'))
    return (
      <EmptyState title={`${what} was not found`}>
        It may have been removed, or it belongs to a survey you are not a member of. Ask a lead of the survey
        to invite you.
      </EmptyState>
    );
  return (
    <ErrorState
      message={messageOf(error)}
      {...(error instanceof ApiError ? { code: error.code } : {})}
      onRetry={onRetry}
    />
  );
}
