import { queryOptions, type QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { runListSchema, runSchema, type RunSummary } from '../../server/contract/runs';
import { getJson } from './http';
import { soundingKeys } from './sounding-queries';

type RunList = z.output<typeof runListSchema>;

export const runKeys = {
  list: (soundingId: string) => [...soundingKeys.detail(soundingId), 'runs'] as const,
  details: ['runs'] as const,
  detail: (runId: string) => [...runKeys.details, runId] as const,
};

/** The Ledger: every run of the sounding, newest first. */
export const runListQuery = (soundingId: string) =>
  queryOptions({
    queryKey: runKeys.list(soundingId),
    queryFn: async ({ client, signal }) => {
      const fetched = await getJson(`/soundings/${soundingId}/runs`, runListSchema, { signal });
      const known = client.getQueryData<RunList>(runKeys.list(soundingId));
      return { items: known ? withLaterWord(fetched.items, known.items) : fetched.items };
    },
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

/** A fetched Ledger, with what events told of its runs while it was on its way. */
function withLaterWord(fetched: readonly RunSummary[], known: readonly RunSummary[]): RunSummary[] {
  const heard = new Map(known.map((run) => [run.id, run]));
  const newest = Math.max(0, ...fetched.map((run) => run.number));
  const updated = fetched.map((run) => {
    const other = heard.get(run.id);
    return other && isStale(other, run) ? other : run;
  });
  return [...known.filter((run) => run.number > newest), ...updated];
}

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
