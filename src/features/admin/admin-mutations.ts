import { useMutation, useQueryClient } from '@tanstack/react-query';
import { adminSurveySchema, adminUserSchema } from '../../../server/contract/admin';
import type { Role } from '../../../server/contract/roles';
import { sendJson } from '../../api/http';
import { surveyKeys } from '../../api/survey-queries';
import { adminKeys } from './admin-queries';

export function useSetUserState() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ userId, disabled }: { userId: string; disabled: boolean }) =>
      sendJson('PUT', `/admin/users/${userId}/state`, { disabled }, adminUserSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: adminKeys.all }),
  });
}

export function useJoinSurvey() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ surveyId, role }: { surveyId: string; role: Role }) =>
      sendJson('PUT', `/admin/surveys/${surveyId}/membership`, { role }, adminSurveySchema),
    onSuccess: async () => {
      await Promise.all([
        client.invalidateQueries({ queryKey: adminKeys.all }),
        client.invalidateQueries({ queryKey: surveyKeys.all }),
      ]);
    },
  });
}
