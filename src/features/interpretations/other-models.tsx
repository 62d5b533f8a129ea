import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Run, RunSummary } from '../../../server/contract/runs';
import { runListQuery } from '../../api/run-queries';
import { addressOf } from '../../app/addresses';
import { RejectedMark } from '../../runs/rejected-mark';
import { isShowable } from '../../runs/run-standing';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { formatMisfit } from '../../ui/format';

/** The sounding's other models: who reads one ground should see what else was fitted to the same curve. */
export function OtherModels({ run }: { run: Run }) {
  const runs = useQuery(runListQuery(run.soundingId));
  const others = runs.data?.items.filter((other) => other.id !== run.id && isShowable(other)) ?? [];
  if (!runs.data) return null;
  return (
    <section aria-labelledby="other-models-title" className="flex flex-col gap-1">
      <h2 id="other-models-title" className="font-semibold">
        Other models of this sounding
      </h2>
      {others.length === 0 ? <p className="text-muted">None was fitted.</p> : null}
      <ul className="border-b border-rule empty:hidden">
        {others.map((other) => (
          <OtherModel key={other.id} run={other} beside={run} />
        ))}
      </ul>
    </section>
  );
}

function OtherModel({ run, beside }: { run: RunSummary; beside: Run }) {
  const sideBySide = `${addressOf('sideBySide', { soundingId: run.soundingId })}?runs=${beside.id},${run.id}`;
  return (
    <li className="border-t border-rule py-1.5">
      <p className="flex flex-wrap items-baseline justify-between gap-x-3">
        <Link to={sideBySide}>
          Run {letterOfRun(run)}, {titleOfRun(run)}
        </Link>
        <span className="figure whitespace-nowrap">
          {run.outcome ? `χ²/N ${formatMisfit(run.outcome.chi2PerReading)}` : ''}
        </span>
      </p>
      <RejectedMark fit={run.outcome} />
      {run.note.note === '' ? null : <p className="text-sm text-muted">{run.note.note}</p>}
    </li>
  );
}
