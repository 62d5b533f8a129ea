import type { SurveyCan } from '../../../server/contract/roles';
import type { RunSummary } from '../../../server/contract/runs';
import { messageOf } from '../../api/api-error';
import { letterOfRun } from '../../runs/run-title';
import { Button } from '../../ui/button';
import { formatMoment } from '../../ui/format';
import { showToast } from '../../ui/show-toast';
import { useCancelRun } from './bench-mutations';

/** How far a run has come, in the engine's own numbers; or why it has no result. */
export function RunProgress({ run, can }: { run: RunSummary; can: SurveyCan }) {
  const cancel = useCancelRun(run.soundingId);
  if (run.state === 'finished') return null;
  if (run.state === 'failed')
    return <p className="mt-1 text-sm text-rust">Failed: {run.errorMessage ?? 'no reason was given.'}</p>;
  if (run.state === 'cancelled')
    return (
      <p className="mt-1 text-sm text-muted">Cancelled{run.endedAt ? ` ${formatMoment(run.endedAt)}` : ''}</p>
    );
  const percent = Math.round(run.progress * 100);
  const words = run.state === 'queued' ? 'waiting for a free worker' : run.progressText || 'starting';
  return (
    <div className="mt-1.5">
      <progress
        value={run.state === 'queued' ? 0 : percent}
        max={100}
        aria-label={`Progress of run ${letterOfRun(run)}`}
        aria-valuetext={words}
        className="block h-1.5 w-full appearance-none overflow-hidden rounded-sm bg-rule [&::-moz-progress-bar]:bg-water [&::-webkit-progress-bar]:bg-rule [&::-webkit-progress-value]:bg-water"
      />
      <div className="mt-1 flex flex-wrap items-center justify-between gap-x-2">
        <span className="text-sm text-muted tabular-nums">{words}</span>
        {can.run ? (
          <Button
            kind="quiet"
            size="small"
            loading={cancel.isPending}
            onClick={() =>
              cancel.mutate(run.id, {
                onError: (error) =>
                  showToast({ kind: 'bad', title: 'Not cancelled', description: messageOf(error) }),
              })
            }
          >
            Cancel<span className="sr-only"> run {letterOfRun(run)}</span>
          </Button>
        ) : null}
      </div>
    </div>
  );
}
