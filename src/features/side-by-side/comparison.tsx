import { useMemo } from 'react';
import { compareFits } from '../../../inversion';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { DepthColumns } from '../../charts/depth-columns';
import { columnOfRun } from '../../runs/curve-of-run';
import { letterOfRun } from '../../runs/run-title';
import { Field } from '../../ui/field';
import { Notice } from '../../ui/notice';
import { Select } from '../../ui/select';
import { BedComparison } from './bed-comparison';
import { ComparedCurves } from './compared-curves';
import { DifferenceSection } from './difference-section';
import { FactComparison } from './fact-comparison';
import { isFinished, outcomeRows, settingRows } from './run-facts-table';

export interface ComparisonProps {
  sounding: Sounding;
  /** Two to six, each with its result. */
  runs: readonly Run[];
  baseId: string | null;
  onBase: (runId: string) => void;
}

export function Comparison({ sounding, runs, baseId, onBase }: ComparisonProps) {
  const finished = useMemo(() => runs.filter(isFinished), [runs]);
  const base = finished.find((run) => run.id === baseId) ?? finished[0];
  const ordered = useMemo(
    () => (base ? [base, ...finished.filter((run) => run.id !== base.id)] : finished),
    [base, finished],
  );
  const pairs = useMemo(
    () =>
      compareFits(
        ordered.map((run) => run.result),
        ordered.map((run) => `Run ${letterOfRun(run)}`),
      ).pairs.filter((pair) => pair.first === 0),
    [ordered],
  );
  const columns = useMemo(() => ordered.flatMap((run) => columnOfRun(run) ?? []), [ordered]);
  if (!base) return null;
  const revisions = new Set(ordered.map((run) => run.revisionNumber));
  return (
    <div className="mt-6 flex flex-col gap-9">
      <Field label="Compare with run" className="w-56 print:hidden">
        <Select
          value={base.id}
          onChange={(event) => onBase(event.target.value)}
          options={finished.map((run) => ({ value: run.id, label: letterOfRun(run) }))}
        />
      </Field>
      {revisions.size > 1 ? (
        <Notice tone="caution">
          These runs were fitted to different readings (revisions{' '}
          {[...revisions].toSorted((a, b) => a - b).join(', ')}
          ), so their misfits are not of the same curve. The readings drawn are those of run{' '}
          {letterOfRun(base)}.
        </Notice>
      ) : null}
      <ComparedCurves sounding={sounding} runs={ordered} base={base} />
      <DepthColumns columns={columns} title="Ground" subject={sounding.name} height={440} />
      {pairs.map((pair) => {
        const other = ordered[pair.second];
        return other ? <DifferenceSection key={other.id} base={base} other={other} pair={pair} /> : null;
      })}
      <BedComparison runs={ordered} />
      <FactComparison title="How they fit" runs={ordered} rows={outcomeRows(ordered)} />
      <FactComparison title="What was asked for" runs={ordered} rows={settingRows(ordered)} />
    </div>
  );
}
