import type { Run, RunSummary } from '../../../server/contract/runs';
import { letterOfRun } from '../../runs/run-title';
import { Notice } from '../../ui/notice';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';

/** Whether a run that was computed again gave the same answer, and if not, where it differs. */
export function RecomputationVerdict({ run, runs }: { run: Run; runs: readonly RunSummary[] }) {
  const { comparison } = run;
  if (!comparison) return null;
  const against = runs.find((other) => other.id === comparison.againstRunId);
  const name = against ? `run ${letterOfRun(against)}` : 'the earlier run';
  if (comparison.verdict === 'identical')
    return (
      <div className="mt-2">
        <Notice>Computed again: identical to {name}, every number to the last digit.</Notice>
      </div>
    );
  return (
    <div className="mt-2">
      <Notice tone="caution" title={`Computed again: differs from ${name}`}>
        <Table caption={`Where this run differs from ${name}`} frameClassName="max-h-64">
          <TableHead>
            <HeaderCell>Value</HeaderCell>
            <HeaderCell>Before</HeaderCell>
            <HeaderCell>Now</HeaderCell>
          </TableHead>
          <TableBody>
            {comparison.differences.map((difference) => (
              <TableRow key={difference.path}>
                <Cell className="figure">{difference.path}</Cell>
                <Cell className="figure">{difference.before}</Cell>
                <Cell className="figure">{difference.after}</Cell>
              </TableRow>
            ))}
          </TableBody>
        </Table>
      </Notice>
    </div>
  );
}
