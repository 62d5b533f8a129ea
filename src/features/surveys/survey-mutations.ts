import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  surveySchema,
  type createSurveySchema,
  type updateSurveySchema,
} from '../../../server/contract/surveys';
import { sendJson } from '../../api/http';
import { soundingKeys } from '../../api/sounding-queries';
import { surveyKeys } from '../../api/survey-queries';

export function useCreateSurvey() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.output<typeof createSurveySchema>) =>
      sendJson('POST', '/surveys', body, surveySchema),
    onSuccess: () => client.invalidateQueries({ queryKey: surveyKeys.list() }),
  });
}

interface SurveyEdit {
  body: z.output<typeof updateSurveySchema>;
  version: number;
}

export function useUpdateSurvey(surveyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ body, version }: SurveyEdit) =>
      sendJson('PATCH', `/surveys/${surveyId}`, body, surveySchema, { version }),
    onSuccess: async () => {
      await Promise.all([
        client.invalidateQueries({ queryKey: surveyKeys.list() }),
        client.invalidateQueries({ queryKey: surveyKeys.detail(surveyId) }),
        // a sounding carries the survey's name and error floor
        client.invalidateQueries({ queryKey: soundingKeys.all }),
      ]);
    },
  });
}
