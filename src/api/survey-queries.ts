import { queryOptions } from '@tanstack/react-query';
import {
  boreholeListSchema,
  lineListSchema,
  surveyListSchema,
  surveySchema,
} from '../../server/contract/surveys';
import { getJson } from './http';

export const surveyKeys = {
  all: ['surveys'] as const,
  list: () => [...surveyKeys.all, 'list'] as const,
  detail: (surveyId: string) => [...surveyKeys.all, 'detail', surveyId] as const,
  lines: (surveyId: string) => [...surveyKeys.detail(surveyId), 'lines'] as const,
  boreholes: (surveyId: string) => [...surveyKeys.detail(surveyId), 'boreholes'] as const,
};

export const surveyListQuery = queryOptions({
  queryKey: surveyKeys.list(),
  queryFn: ({ signal }) => getJson('/surveys', surveyListSchema, { signal }),
});

export const surveyQuery = (surveyId: string) =>
  queryOptions({
    queryKey: surveyKeys.detail(surveyId),
    queryFn: ({ signal }) => getJson(`/surveys/${surveyId}`, surveySchema, { signal }),
  });

export const lineListQuery = (surveyId: string) =>
  queryOptions({
    queryKey: surveyKeys.lines(surveyId),
    queryFn: ({ signal }) => getJson(`/surveys/${surveyId}/lines`, lineListSchema, { signal }),
  });

export const boreholeListQuery = (surveyId: string) =>
  queryOptions({
    queryKey: surveyKeys.boreholes(surveyId),
    queryFn: ({ signal }) => getJson(`/surveys/${surveyId}/boreholes`, boreholeListSchema, { signal }),
  });
