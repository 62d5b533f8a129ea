import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { runListSchema, runSchema, type RunSummary } from '../../server/contract/runs';
import { getJson } from './http';
import { soundingKeys } from './sounding-queries';

export const runKeys = {
  list: (soundingId: string) => [...soundingKeys.detail(soundingId), 'runs'] as const,
  details: ['runs'] as const,
  detail: (runId: string) => [...runKeys.details, runId] as const,
};

/** The Ledger: every run of the sounding, newest first. */
export const runListQuery = (soundingId: string) =>
  queryOptions({
    queryKey: runKeys.list(soundingId),
    queryFn: ({ signal }) => getJson(`/soundings/${soundingId}/runs`, runListSchema, { signal }),
  });

/** One run with its frozen readings and its whole result. */
export const runQuery = (runId: string) =>
  queryOptions({
    queryKey: runKeys.detail(runId),
    queryFn: ({ signal }) => getJson(`/runs/${runId}`, runSchema, { signal }),
  });

export const hasEnded = (run: Pick<RunSummary, 'state'>): boolean =>
  run.state !== 'queued' && run.state !== 'running';

/** Where an event and a list that was fetched meanwhile disagree, the one further on is right. */
const isStale = (known: RunSummary, heard: RunSummary): boolean =>
  (hasEnded(known) && !hasEnded(heard)) ||
  (known.state === heard.state && known.progress > heard.progress) ||
  known.note.version > heard.note.version;

/** Puts a run as the server tells it now into the Ledger; a new one stands first. */
export function putRun(client: QueryClient, run: RunSummary): void {
  client.setQueryData(runListQuery(run.soundingId).queryKey, (list) => {
    if (!list) return list;
    const at = list.items.findIndex((known) => known.id === run.id);
    if (at === -1) return { items: [run, ...list.items].toSorted((a, b) => b.number - a.number) };
    const known = list.items[at];
    return known && isStale(known, run) ? list : { items: list.items.with(at, run) };
  });
}
