import { Pin } from 'lucide-react';
import type { SurveyCan } from '../../../server/contract/roles';
import type { RunSummary } from '../../../server/contract/runs';
import { runStyle } from '../../charts/run-style';
import { useChartPalette } from '../../charts/chart-palette';
import { cacheWords } from '../../runs/cache-words';
import { InterpretationStateMark } from '../../runs/interpretation-state-mark';
import { MISFIT_TITLE } from '../../runs/misfit-words';
import { MiniColumn } from '../../runs/mini-column';
import { RejectedMark } from '../../runs/rejected-mark';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { Badge } from '../../ui/badge';
import { Checkbox } from '../../ui/checkbox';
import { classNames } from '../../ui/class-names';
import { formatMisfit, formatMoment, formatPercent } from '../../ui/format';
import { LedgerMenu } from './ledger-menu';
import { RunProgress } from './run-progress';

export interface LedgerRowProps {
  run: RunSummary;
  runs: readonly RunSummary[];
  isShown: boolean;
  isChosen: boolean;
  mayChoose: boolean;
  can: SurveyCan;
  onOpen: () => void;
  onChoose: (chosen: boolean) => void;
}

export function LedgerRow(props: LedgerRowProps) {
  const { run, runs, isShown, isChosen, mayChoose, can, onOpen, onChoose } = props;
  const { color } = runStyle(letterOfRun(run), useChartPalette());
  const letter = letterOfRun(run);
  const isFinished = run.state === 'finished' && run.outcome !== null;
  return (
    <li
      className={classNames(
        'grid grid-cols-[1.25rem_1.25rem_1.25rem_minmax(0,1fr)_auto_auto] items-start gap-x-2 border-b border-rule py-2.5 pl-1',
        isShown && 'bg-water-tint',
      )}
    >
      <span className="pt-0.5">
        {isFinished ? (
          <Checkbox
            labelHidden
            label={`Choose run ${letter} for side by side`}
            title="Choose for side by side"
            checked={isChosen}
            disabled={!mayChoose}
            onChange={(event) => onChoose(event.target.checked)}
          />
        ) : null}
      </span>
      <span className="figure pt-0.5 font-semibold" style={{ color }}>
        {letter}
      </span>
      <MiniColumn earth={run.outcome?.earth ?? null} />
      <div className="min-w-0">
        {isFinished ? (
          <button
            type="button"
            onClick={onOpen}
            aria-current={isShown || undefined}
            className="block min-h-6 max-w-full rounded text-left hover:text-copper touch:min-h-11"
          >
            <span className="sr-only">Open run {letter}: </span>
            <span className="wrap-anywhere">{titleOfRun(run)}</span>
          </button>
        ) : (
          <p>{titleOfRun(run)}</p>
        )}
        <p className="text-sm text-muted">
          {formatMoment(run.requestedAt)}, {run.requestedBy.name}
        </p>
        <RejectedMark fit={run.outcome} />
        <RunMarks run={run} runs={runs} />
        <RunProgress run={run} can={can} />
      </div>
      <div className="figure pt-0.5 text-right">
        {run.outcome ? (
          <>
            <span className="block" title={MISFIT_TITLE}>
              {formatMisfit(run.outcome.chi2PerReading)}
            </span>
            <span className="block text-sm text-muted" title="rms misfit">
              {formatPercent(run.outcome.rmsPercent)}
            </span>
          </>
        ) : null}
      </div>
      <LedgerMenu run={run} can={can} />
    </li>
  );
}

function RunMarks({ run, runs }: { run: RunSummary; runs: readonly RunSummary[] }) {
  const original = runs.find((other) => other.id === run.recomputesRunId);
  const marks = [
    run.interpretedAs !== null && (
      <span key="interpreted" className="text-sm">
        <span className="sr-only">Interpretation: </span>
        <InterpretationStateMark state={run.interpretedAs} />
      </span>
    ),
    run.note.pinned && (
      <span key="pin" className="inline-flex items-center gap-1 text-sm text-muted">
        <Pin aria-hidden size={12} /> pinned
      </span>
    ),
    run.fromCache && <Badge key="cache">{cacheWords(run, runs)}</Badge>,
    run.ofOlderReadings && (
      <Badge key="older" tone="copper">
        older readings, revision {run.revisionNumber}
      </Badge>
    ),
    run.recomputesRunId !== null && (
      <Badge key="again">computed again{original ? ` from ${letterOfRun(original)}` : ''}</Badge>
    ),
    run.comparison !== null && (
      <Badge key="verdict" tone={run.comparison.verdict === 'identical' ? 'water' : 'rust'}>
        {run.comparison.verdict === 'identical' ? 'identical' : 'differs'}
      </Badge>
    ),
  ].filter(Boolean);
  return marks.length === 0 ? null : <p className="mt-1 flex flex-wrap items-center gap-1.5">{marks}</p>;
}
