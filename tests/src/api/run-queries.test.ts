import { QueryClient } from '@tanstack/react-query';
import { beforeEach, expect, it } from 'vitest';
import type { RunSummary } from '../../../server/contract/runs';
import { putRun, runListQuery } from '../../../src/api/run-queries';

const run = (number: number, state: RunSummary['state'], progress = 0, noteVersion = 1) =>
  ({
    id: `run ${number}`,
    soundingId: 's',
    number,
    state,
    progress,
    note: { version: noteVersion },
  }) as RunSummary;

let client: QueryClient;
const items = () => client.getQueryData(runListQuery('s').queryKey)?.items ?? [];

beforeEach(() => {
  client = new QueryClient();
  client.setQueryData(runListQuery('s').queryKey, { items: [run(2, 'running', 0.5), run(1, 'finished', 1)] });
});

it('puts a run in the place of what was known of it, a new one first', () => {
  putRun(client, run(2, 'running', 0.7));
  putRun(client, run(3, 'queued'));
  expect(items().map(({ number, progress }) => [number, progress])).toEqual([
    [3, 0],
    [2, 0.7],
    [1, 1],
  ]);
});

it('keeps what is further on when an older word comes late', () => {
  putRun(client, run(1, 'running', 0.9));
  putRun(client, run(2, 'running', 0.4));
  expect(items()).toEqual([run(2, 'running', 0.5), run(1, 'finished', 1)]);
});

it('keeps a newer note', () => {
  putRun(client, run(1, 'finished', 1, 3));
  putRun(client, run(1, 'finished', 1, 2));
  expect(items()[1]?.note.version).toBe(3);
});

it('leaves a Ledger that was never fetched to its own fetching', () => {
  client.clear();
  putRun(client, run(4, 'queued'));
  expect(items()).toEqual([]);
});
