import { useChartPalette } from '../../charts/chart-palette';
import { runStyle } from '../../charts/run-style';
import type { Run } from '../../../server/contract/runs';
import { RejectedMark } from '../../runs/rejected-mark';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { HeaderCell, TableHead } from '../../ui/table';

/** A head with one column a run, after the column of what is compared. */
export function RunHeads({ runs, first }: { runs: readonly Run[]; first: string }) {
  const palette = useChartPalette();
  return (
    <TableHead>
      <HeaderCell className="w-20 align-top sm:w-36">{first}</HeaderCell>
      {runs.map((run) => (
        <HeaderCell key={run.id} className="align-top">
          <span className="block whitespace-normal">
            <span className="figure" style={{ color: runStyle(letterOfRun(run), palette).color }}>
              {letterOfRun(run)}
            </span>{' '}
            <span className="font-normal">{titleOfRun(run)}</span>
            <span className="block font-normal">
              <RejectedMark fit={run.result} />
            </span>
          </span>
        </HeaderCell>
      ))}
    </TableHead>
  );
}
