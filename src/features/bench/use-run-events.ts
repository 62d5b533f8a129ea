import { useQueryClient } from '@tanstack/react-query';
import type { StreamState } from '../../api/event-stream';
import { putRun, runKeys, runListQuery } from '../../api/run-queries';
import { useEventStream } from '../../api/use-event-stream';
import { runSummarySchema, type RunSummary } from '../../../server/contract/runs';

/** Keeps the Ledger as the server has it, while the Bench is shown. */
export function useRunEvents(soundingId: string): StreamState {
  const client = useQueryClient();
  const listKey = runListQuery(soundingId).queryKey;
  const hear = (run: RunSummary) => {
    const before = client.getQueryData(listKey)?.items.find((known) => known.id === run.id);
    putRun(client, run);
    if (before?.state !== run.state) void client.invalidateQueries({ queryKey: runKeys.detail(run.id) });
  };
  return useEventStream({
    path: `/soundings/${soundingId}/run-events`,
    event: 'run',
    schema: runSummarySchema,
    onEvent: hear,
    onOpen: () => void client.invalidateQueries({ queryKey: listKey }),
  });
}
