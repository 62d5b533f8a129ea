import type { Run } from '../../../server/contract/runs';
import { boundaryDepths } from '../../charts/chart-data';
import { BedSwatch } from '../../runs/bed-swatch';
import { hasBeds } from '../../runs/run-standing';
import { isRejected } from '../../runs/rejected-fit';
import { formatLength, formatRange, formatResistivity, withUnit } from '../../ui/format';
import { Cell, Table, TableBody, TableRow } from '../../ui/table';
import { RunHeads } from './run-heads';
import { tableWidth } from './table-width';

const RANGES_ASSUME = ', which assumes that the run explains the readings';

/** Bed by bed from the surface: value and 95 % range of each run. */
export function BedComparison({ runs }: { runs: readonly Run[] }) {
  const most = Math.max(
    ...runs.map((run) => (hasBeds(run) ? (run.result?.earth.resistivity.length ?? 0) : 0)),
  );
  if (most === 0) return null;
  return (
    <section aria-labelledby="beds-title">
      <h2 id="beds-title" className="mb-1 font-semibold">
        Beds{' '}
        <span className="ml-2 text-sm font-normal text-muted">
          value, and its 95&nbsp;% range below
          {runs.some((run) => isRejected(run.result)) ? RANGES_ASSUME : ''}
        </span>
      </h2>
      <Table caption="Beds of each run" className="table-fixed" style={tableWidth(runs.length)}>
        <RunHeads runs={runs} first="Bed" />
        <TableBody>
          {Array.from({ length: most }, (_, bed) => (
            <TableRow key={bed}>
              <Cell className="figure align-top">{bed + 1}</Cell>
              {runs.map((run) => (
                <Cell key={run.id} className="align-top">
                  <BedOfRun run={run} bed={bed} />
                </Cell>
              ))}
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </section>
  );
}

function BedOfRun({ run, bed }: { run: Run; bed: number }) {
  const { result } = run;
  const resistivity = result?.earth.resistivity[bed];
  if (!hasBeds(run)) return <span className="text-muted">{bed === 0 ? 'cells, no beds' : ''}</span>;
  if (!result || resistivity === undefined) return <span className="text-muted">none</span>;
  const base = boundaryDepths(result.earth)[bed];
  return (
    <div className="py-0.5 leading-snug whitespace-nowrap">
      <p>
        <BedSwatch resistivity={resistivity} />{' '}
        <span className="figure">{withUnit(formatResistivity(resistivity), 'Ω·m')}</span>
      </p>
      <p className="figure text-sm text-muted">
        {formatRange(result.intervals.resistivity[bed] ?? [null, null])}
      </p>
      {base === undefined ? (
        <p className="mt-1 text-muted">to any depth</p>
      ) : (
        <>
          <p className="mt-1">
            base <span className="figure">{withUnit(formatLength(base), 'm')}</span>
          </p>
          <p className="figure text-sm text-muted">
            {formatRange(result.intervals.depth[bed] ?? [null, null])}
          </p>
        </>
      )}
    </div>
  );
}
