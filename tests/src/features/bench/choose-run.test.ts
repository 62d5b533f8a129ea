import { expect, it } from 'vitest';
import type { RunSummary } from '../../../../server/contract/runs';
import { chooseRun, ledgerOrder } from '../../../../src/features/bench/choose-run';

const run = (number: number, state: RunSummary['state'], pinned = false) =>
  ({
    id: `run ${number}`,
    number,
    state,
    outcome: state === 'finished' ? {} : null,
    note: { pinned },
  }) as RunSummary;

it('shows the run asked for, else the pinned one, else the newest with a result', () => {
  const runs = [run(3, 'running'), run(2, 'finished'), run(1, 'finished', true)];
  expect(chooseRun(runs, 'run 2')?.id).toBe('run 2');
  expect(chooseRun(runs, null)?.id).toBe('run 1');
  expect(chooseRun(runs, 'run 3')?.id).toBe('run 1');
  expect(chooseRun(runs.slice(0, 2), null)?.id).toBe('run 2');
  expect(chooseRun([run(1, 'failed')], null)).toBeNull();
});

it('puts pinned runs first, then the newest', () => {
  const runs = [run(1, 'finished'), run(2, 'finished', true), run(3, 'queued')];
  expect(ledgerOrder(runs).map((each) => each.number)).toEqual([2, 3, 1]);
});
