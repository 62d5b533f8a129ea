import { QueryClient } from '@tanstack/react-query';
import { beforeEach, expect, it, vi } from 'vitest';
import type { RunSummary } from '../../../server/contract/runs';
import { getJson } from '../../../src/api/http';
import { putRun, runListQuery } from '../../../src/api/run-queries';

vi.mock('../../../src/api/http', () => ({ getJson: vi.fn<typeof getJson>() }));

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

it('lets no Ledger that was asked for earlier take back what events told meanwhile', async () => {
  let answer = (_list: { items: RunSummary[] }) => {};
  vi.mocked(getJson).mockReturnValue(new Promise((resolve) => (answer = resolve)));
  const fetching = client.fetchQuery(runListQuery('s'));
  putRun(client, run(2, 'finished', 1));
  putRun(client, run(3, 'queued'));
  answer({ items: [run(2, 'running', 0.8), run(1, 'finished', 1, 2)] });
  await fetching;
  expect(items()).toEqual([run(3, 'queued'), run(2, 'finished', 1), run(1, 'finished', 1, 2)]);
});
