import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { sendJson } from '../../api/http';
import { putRun, runKeys, runListQuery } from '../../api/run-queries';
import { soundingKeys } from '../../api/sounding-queries';
import type { FitSettingsInput } from '../../../server/contract/fit-settings';
import { runSchema, type Run, type updateRunNoteSchema } from '../../../server/contract/runs';

export type RunNoteChange = z.input<typeof updateRunNoteSchema>;

/** What follows when a run came or changed: its Ledger, itself, and the lists that show the latest run. */
function useRunArrival(soundingId: string) {
  const client = useQueryClient();
  return async (run: Run) => {
    // Kept without its result, a run would be shown empty at the moment it is opened.
    if (run.result !== null) client.setQueryData(runKeys.detail(run.id), run);
    await client.invalidateQueries({ queryKey: runListQuery(soundingId).queryKey });
    await client.invalidateQueries({ queryKey: soundingKeys.lists(), refetchType: 'none' });
  };
}

export function useRequestRun(soundingId: string) {
  const arrive = useRunArrival(soundingId);
  return useMutation({
    mutationFn: (settings: FitSettingsInput) =>
      sendJson('POST', `/soundings/${soundingId}/runs`, { settings }, runSchema),
    onSuccess: arrive,
  });
}

export function useRecomputeRun(soundingId: string) {
  const arrive = useRunArrival(soundingId);
  return useMutation({
    mutationFn: (runId: string) => sendJson('POST', `/runs/${runId}/recomputation`, undefined, runSchema),
    onSuccess: arrive,
  });
}

export function useCancelRun(soundingId: string) {
  const arrive = useRunArrival(soundingId);
  return useMutation({
    mutationFn: (runId: string) => sendJson('PUT', `/runs/${runId}/cancellation`, {}, runSchema),
    onSuccess: arrive,
  });
}

export function useUpdateRunNote(soundingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (edit: { runId: string; change: RunNoteChange; version: number }) =>
      sendJson('PATCH', `/runs/${edit.runId}/note`, edit.change, runSchema, { version: edit.version }),
    onSuccess: async (run) => {
      putRun(client, run);
      await client.invalidateQueries({ queryKey: runKeys.detail(run.id) });
      await client.invalidateQueries({ queryKey: runListQuery(soundingId).queryKey });
    },
  });
}
