import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  soundingSchema,
  type createSoundingSchema,
  type updateSoundingSchema,
} from '../../server/contract/soundings';
import { lineSchema, type createLineSchema } from '../../server/contract/surveys';
import { sendJson } from '../api/http';
import { soundingKeys } from '../api/sounding-queries';
import { surveyKeys } from '../api/survey-queries';

const invalidateLists = (client: QueryClient, surveyId: string) =>
  Promise.all([
    client.invalidateQueries({ queryKey: soundingKeys.surveyLists(surveyId) }),
    client.invalidateQueries({ queryKey: surveyKeys.list() }),
    client.invalidateQueries({ queryKey: surveyKeys.detail(surveyId) }),
  ]);

export function useCreateSounding(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof createSoundingSchema>) =>
      sendJson('POST', `/surveys/${surveyId}/soundings`, body, soundingSchema),
    onSuccess: () => invalidateLists(client, surveyId),
  });
}

interface SoundingEdit {
  body: z.output<typeof updateSoundingSchema>;
  version: number;
}

export function useUpdateSounding(soundingId: string, surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ body, version }: SoundingEdit) =>
      sendJson('PATCH', `/soundings/${soundingId}`, body, soundingSchema, { version }),
    onSuccess: async () => {
      await Promise.all([
        client.invalidateQueries({ queryKey: soundingKeys.detail(soundingId) }),
        invalidateLists(client, surveyId),
      ]);
    },
  });
}

export function useCreateLine(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof createLineSchema>) =>
      sendJson('POST', `/surveys/${surveyId}/lines`, body, lineSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: surveyKeys.lines(surveyId) }),
  });
}
