import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { sendJson } from '../../api/http';
import { soundingKeys } from '../../api/sounding-queries';
import { surveyKeys } from '../../api/survey-queries';
import {
  interpretationSchema,
  type createInterpretationSchema,
  type createReviewEventSchema,
  type Interpretation,
  type updateInterpretationSchema,
} from '../../../server/contract/interpretations';
import { interpretationKeys } from './interpretation-queries';

export type ReviewEventInput = z.input<typeof createReviewEventSchema>;

/** The lists an interpretation stands in, and the state of its sounding and survey. */
async function refreshAround(client: QueryClient, soundingId: string): Promise<void> {
  await client.invalidateQueries({ queryKey: soundingKeys.detail(soundingId) });
  await client.invalidateQueries({ queryKey: soundingKeys.lists(), refetchType: 'none' });
  await client.invalidateQueries({ queryKey: surveyKeys.all, refetchType: 'none' });
}

/** An interpretation came or changed. */
function useInterpretationArrival() {
  const client = useQueryClient();
  return async (interpretation: Interpretation) => {
    client.setQueryData(interpretationKeys.detail(interpretation.id), interpretation);
    await refreshAround(client, interpretation.soundingId);
    // An acceptance supersedes another interpretation of the sounding.
    await client.invalidateQueries({ queryKey: ['interpretations'], refetchType: 'none' });
  };
}

export function useCreateInterpretation(soundingId: string) {
  const arrive = useInterpretationArrival();
  return useMutation({
    mutationFn: (body: z.input<typeof createInterpretationSchema>) =>
      sendJson('POST', `/soundings/${soundingId}/interpretations`, body, interpretationSchema),
    onSuccess: arrive,
  });
}

export function useSaveInterpretation(interpretationId: string) {
  const arrive = useInterpretationArrival();
  return useMutation({
    mutationFn: (edit: { change: z.input<typeof updateInterpretationSchema>; version: number }) =>
      sendJson('PATCH', `/interpretations/${interpretationId}`, edit.change, interpretationSchema, {
        version: edit.version,
      }),
    onSuccess: arrive,
  });
}

export function useReviewEvent(interpretationId: string) {
  const arrive = useInterpretationArrival();
  return useMutation({
    mutationFn: (event: ReviewEventInput) =>
      sendJson('POST', `/interpretations/${interpretationId}/review-events`, event, interpretationSchema),
    onSuccess: arrive,
  });
}

export function useDiscardInterpretation({ id, soundingId }: Pick<Interpretation, 'id' | 'soundingId'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => sendJson('DELETE', `/interpretations/${id}`, undefined, null),
    onSuccess: () => refreshAround(client, soundingId),
    onSettled: (_, error) => {
      if (!error) client.removeQueries({ queryKey: interpretationKeys.detail(id) });
    },
  });
}
