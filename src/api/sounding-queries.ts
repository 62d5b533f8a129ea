import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { fieldSheetSchema, revisionListSchema, revisionSchema } from '../../server/contract/readings';
import {
  soundingPageSchema,
  soundingSchema,
  type soundingQuerySchema,
} from '../../server/contract/soundings';
import { getJson, queryText } from './http';

export type SoundingListFilter = Partial<z.output<typeof soundingQuerySchema>>;

/** A sounding's page, its sheet, runs and interpretations all lie under its detail key. */
export const soundingKeys = {
  all: ['soundings'] as const,
  lists: () => [...soundingKeys.all, 'list'] as const,
  surveyLists: (surveyId: string) => [...soundingKeys.lists(), surveyId] as const,
  list: (surveyId: string, filter: SoundingListFilter) =>
    [...soundingKeys.surveyLists(surveyId), filter] as const,
  detail: (soundingId: string) => [...soundingKeys.all, 'detail', soundingId] as const,
  fieldSheet: (soundingId: string) => [...soundingKeys.detail(soundingId), 'field-sheet'] as const,
  revisions: (soundingId: string) => [...soundingKeys.detail(soundingId), 'revisions'] as const,
};

export const soundingListQuery = (surveyId: string, filter: SoundingListFilter) =>
  queryOptions({
    queryKey: soundingKeys.list(surveyId, filter),
    queryFn: ({ signal }) =>
      getJson(`/surveys/${surveyId}/soundings${queryText({ ...filter })}`, soundingPageSchema, { signal }),
    placeholderData: keepPreviousData,
  });

export const soundingQuery = (soundingId: string) =>
  queryOptions({
    queryKey: soundingKeys.detail(soundingId),
    queryFn: ({ signal }) => getJson(`/soundings/${soundingId}`, soundingSchema, { signal }),
  });

/** The current revision with its derived values and checks, and the reader's own draft. */
export const fieldSheetQuery = (soundingId: string) =>
  queryOptions({
    queryKey: soundingKeys.fieldSheet(soundingId),
    queryFn: ({ signal }) => getJson(`/soundings/${soundingId}/readings`, fieldSheetSchema, { signal }),
  });

export const revisionListQuery = (soundingId: string) =>
  queryOptions({
    queryKey: soundingKeys.revisions(soundingId),
    queryFn: ({ signal }) => getJson(`/soundings/${soundingId}/revisions`, revisionListSchema, { signal }),
  });

/** A revision never changes, so it is fetched once. */
export const revisionQuery = (revisionId: string) =>
  queryOptions({
    queryKey: ['revisions', revisionId] as const,
    queryFn: ({ signal }) => getJson(`/revisions/${revisionId}`, revisionSchema, { signal }),
    staleTime: Infinity,
  });
