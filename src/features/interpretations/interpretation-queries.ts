import { queryOptions } from '@tanstack/react-query';
import { getJson } from '../../api/http';
import { soundingKeys } from '../../api/sounding-queries';
import { interpretationListSchema, interpretationSchema } from '../../../server/contract/interpretations';

export const interpretationKeys = {
  list: (soundingId: string) => [...soundingKeys.detail(soundingId), 'interpretations'] as const,
  detail: (interpretationId: string) => ['interpretations', interpretationId] as const,
};

export const interpretationListQuery = (soundingId: string) =>
  queryOptions({
    queryKey: interpretationKeys.list(soundingId),
    queryFn: ({ signal }) =>
      getJson(`/soundings/${soundingId}/interpretations`, interpretationListSchema, { signal }),
  });

export const interpretationQuery = (interpretationId: string) =>
  queryOptions({
    queryKey: interpretationKeys.detail(interpretationId),
    queryFn: ({ signal }) =>
      getJson(`/interpretations/${interpretationId}`, interpretationSchema, { signal }),
  });
