import { Link } from 'react-router-dom';
import type { Run } from '../../../server/contract/runs';
import { addressOf } from '../../app/addresses';
import { DoubtList } from '../../runs/doubt-list';
import { isRejected } from '../../runs/rejected-fit';
import { MISFIT_LABEL, MISFIT_TITLE } from '../../runs/misfit-words';
import { MisfitLine } from '../../runs/rejected-mark';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { FigureStrip } from '../../ui/figure-strip';
import { formatMisfit, formatPercent } from '../../ui/format';

/** The run the words stand on: how it fits and what it leaves open. */
export function RunBasis({ run }: { run: Run }) {
  const { result } = run;
  const letter = letterOfRun(run);
  return (
    <section aria-labelledby="run-basis-title" className="flex flex-col gap-3">
      <h2 id="run-basis-title" className="font-semibold">
        Run {letter}
        <span className="ml-3 text-sm font-normal text-muted">{titleOfRun(run)}</span>
      </h2>
      {result ? (
        <>
          <FigureStrip
            items={[
              {
                value: (
                  <span className={isRejected(result) ? 'text-rust' : undefined}>
                    {formatMisfit(result.chi2PerReading)}
                  </span>
                ),
                label: <span title={MISFIT_TITLE}>{MISFIT_LABEL}</span>,
              },
              { value: formatPercent(result.rmsPercent), label: 'rms misfit' },
            ]}
          />
          <MisfitLine fit={result} />
          <h3 className="font-semibold">What the data cannot tell</h3>
          <DoubtList result={result} run={run} />
        </>
      ) : null}
      <p className="text-sm text-muted">
        Readings revision {run.revisionNumber}
        {run.ofOlderReadings ? '; the Field sheet has changed since' : ''}.{' '}
        <Link
          to={`${addressOf('bench', { soundingId: run.soundingId })}?run=${run.id}`}
          className="text-ink underline underline-offset-2 print:hidden"
        >
          See run {letter} on the Bench
        </Link>
      </p>
    </section>
  );
}
