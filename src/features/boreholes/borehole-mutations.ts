import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { boreholeSchema, type writeBoreholeSchema } from '../../../server/contract/surveys';
import { sendJson } from '../../api/http';
import { surveyKeys } from '../../api/survey-queries';

interface BoreholeWrite {
  /** null = a new one */
  boreholeId: string | null;
  body: z.output<typeof writeBoreholeSchema>;
  version: number;
}

export function useWriteBorehole(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ boreholeId, body, version }: BoreholeWrite) =>
      boreholeId === null
        ? sendJson('POST', `/surveys/${surveyId}/boreholes`, body, boreholeSchema)
        : sendJson('PUT', `/boreholes/${boreholeId}`, body, boreholeSchema, { version }),
    onSuccess: () => client.invalidateQueries({ queryKey: surveyKeys.boreholes(surveyId) }),
  });
}
