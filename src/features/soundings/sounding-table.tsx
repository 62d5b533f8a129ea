import { Link } from 'react-router-dom';
import type { SoundingRow } from '../../../server/contract/soundings';
import { addressOf } from '../../app/addresses';
import { CurveSparkline } from '../../charts/curve-sparkline';
import { RejectedMark } from '../../runs/rejected-mark';
import { letterOfRun } from '../../runs/run-title';
import { SoundingStateMark } from '../../soundings/sounding-state-mark';
import { SPREAD_LABELS } from '../../soundings/spread-words';
import { formatDay, formatMisfit, formatPercent } from '../../ui/format';
import { Cell, HeaderCell, Table, TableBody, TableHead, TableRow } from '../../ui/table';
import type { SoundingListParams, SortKey } from './sounding-list-params';

interface SoundingTableProps {
  items: readonly SoundingRow[];
  params: SoundingListParams;
  onSort: (sort: SortKey) => void;
}

export function SoundingTable({ items, params, onSort }: SoundingTableProps) {
  const sortable = (sort: SortKey) => ({
    sorted:
      params.sort === sort
        ? params.order === 'asc'
          ? ('ascending' as const)
          : ('descending' as const)
        : null,
    onSort: () => onSort(sort),
  });
  return (
    <Table caption="Soundings">
      <TableHead>
        <HeaderCell {...sortable('name')}>Sounding</HeaderCell>
        <HeaderCell>Curve</HeaderCell>
        <HeaderCell className="hidden sm:table-cell" {...sortable('line')}>
          Line
        </HeaderCell>
        <HeaderCell className="hidden lg:table-cell">Spread</HeaderCell>
        <HeaderCell className="hidden md:table-cell" {...sortable('measuredOn')}>
          Measured
        </HeaderCell>
        <HeaderCell className="hidden xl:table-cell" numeric>
          Readings
        </HeaderCell>
        <HeaderCell className="hidden sm:table-cell" numeric {...sortable('layers')}>
          Beds
        </HeaderCell>
        <HeaderCell
          className="hidden sm:table-cell"
          numeric
          unit="χ²/N"
          title="χ² per reading: near 1 the fit misses the readings by as much as their errors allow"
          {...sortable('misfit')}
        >
          Misfit
        </HeaderCell>
        <HeaderCell className="hidden md:table-cell" numeric>
          rms
        </HeaderCell>
        <HeaderCell {...sortable('state')}>State</HeaderCell>
      </TableHead>
      <TableBody>
        {items.map((item) => (
          <Row key={item.id} item={item} />
        ))}
      </TableBody>
    </Table>
  );
}

function Row({ item }: { item: SoundingRow }) {
  const run = item.latestRun;
  const to = addressOf(item.curve.length === 0 ? 'readings' : 'bench', { soundingId: item.id });
  return (
    <TableRow className="relative">
      <Cell className="max-w-40 truncate">
        <Link to={to} className="font-semibold no-underline after:absolute after:inset-0 hover:underline">
          {item.name}
        </Link>
      </Cell>
      <Cell>
        <Curve item={item} />
      </Cell>
      <Cell className="hidden max-w-40 truncate sm:table-cell">{item.lineName}</Cell>
      <Cell className="hidden whitespace-nowrap lg:table-cell">{SPREAD_LABELS[item.spreadType]}</Cell>
      <Cell className="figure hidden whitespace-nowrap md:table-cell">
        {item.measuredOn === null ? '' : formatDay(item.measuredOn)}
      </Cell>
      <Cell className="hidden xl:table-cell" numeric>
        {item.curve.length === 0 ? '' : item.curve.length}
      </Cell>
      <Cell className="hidden sm:table-cell" numeric>
        {run ? (run.layers ?? '–') : null}
      </Cell>
      <Cell className="hidden sm:table-cell" numeric>
        {run ? <Misfit run={run} /> : null}
      </Cell>
      <Cell className="hidden md:table-cell" numeric>
        {run ? formatPercent(run.rmsPercent) : ''}
      </Cell>
      <Cell>
        <span className="inline-flex flex-col items-start leading-tight">
          <SoundingStateMark state={item.state} />
          <RejectedMark fit={run} />
        </span>
      </Cell>
    </TableRow>
  );
}

function Misfit({ run }: { run: NonNullable<SoundingRow['latestRun']> }) {
  return (
    <span className="inline-flex flex-col items-end leading-tight">
      <span>{formatMisfit(run.chi2PerReading)}</span>
      <span className="font-sans text-xs text-muted">run {letterOfRun(run)}</span>
      {run.ofOlderReadings ? <span className="font-sans text-xs text-copper">older readings</span> : null}
    </span>
  );
}

function Curve({ item }: { item: SoundingRow }) {
  if (item.curve.length === 0) return <span className="text-sm text-muted">none yet</span>;
  const toPoint = (point: { spacingM: number; apparentResistivityOhmM: number }) => ({
    spacing: point.spacingM,
    apparentResistivity: point.apparentResistivityOhmM,
  });
  return (
    <CurveSparkline
      label={`Curve of ${item.name}, ${item.curve.length} readings`}
      readings={item.curve.map((point) => ({ ...toPoint(point), excluded: point.excluded }))}
      fitted={item.latestRun ? item.latestRun.predicted.map(toPoint) : null}
    />
  );
}
