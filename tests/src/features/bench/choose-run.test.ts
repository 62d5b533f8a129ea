import { expect, it } from 'vitest';
import type { RunSummary } from '../../../../server/contract/runs';
import { chooseRun, ledgerOrder } from '../../../../src/features/bench/choose-run';

const run = (number: number, state: RunSummary['state'], more: Partial<RunSummary> = {}) =>
  ({
    id: `run ${number}`,
    number,
    state,
    outcome: state === 'finished' ? {} : null,
    interpretedAs: null,
    note: { pinned: false },
    ...more,
  }) as RunSummary;

const PINNED = { note: { label: '', note: '', pinned: true, version: 1 } };

it('shows the run asked for, else the pinned one, else the newest with a result', () => {
  const runs = [run(3, 'running'), run(2, 'finished'), run(1, 'finished', PINNED)];
  expect(chooseRun(runs, 'run 2')?.id).toBe('run 2');
  expect(chooseRun(runs, null)?.id).toBe('run 1');
  expect(chooseRun(runs, 'run 3')?.id).toBe('run 1');
  expect(chooseRun(runs.slice(0, 2), null)?.id).toBe('run 2');
  expect(chooseRun([run(1, 'failed')], null)).toBeNull();
});

it('shows the run under the weightiest interpretation before a newer one', () => {
  const runs = [
    run(5, 'finished'),
    run(4, 'finished', { interpretedAs: 'draft' }),
    run(3, 'finished', { interpretedAs: 'accepted' }),
    run(2, 'finished', { interpretedAs: 'in-review' }),
  ];
  expect(chooseRun(runs, null)?.number).toBe(2);
  expect(chooseRun(runs.slice(0, 3), null)?.number).toBe(3);
  expect(chooseRun([...runs, run(1, 'finished', PINNED)], null)?.number).toBe(1);
});

it('puts pinned runs first, then the newest', () => {
  const runs = [run(1, 'finished'), run(2, 'finished', PINNED), run(3, 'queued')];
  expect(ledgerOrder(runs).map((each) => each.number)).toEqual([2, 3, 1]);
});
