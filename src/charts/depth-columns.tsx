import { useMemo, useState } from 'react';
import { Segmented } from '../ui/segmented';
import { BoreholeBar, WaterMark } from './borehole-bar';
import type { MoveBoundary } from './boundary-marks';
import { ChartFrame } from './chart-frame';
import type { BoreholeLog, GroundColumn } from './chart-data';
import { SANS, useChartPalette } from './chart-palette';
import { ColumnSlot, NARROWEST_BAR, WHISKER_ROOM } from './column-slot';
import { DepthAxis } from './depth-axis';
import { depthScale, type DepthScaleKind } from './depth-scale';
import { labelRoom } from './ground-labels';
import { depthExtent } from './ground-profile';
import { groundTable } from './ground-table';
import { ResistivityLegend } from './resistivity-legend';
import { useBoxSize } from './use-box-size';

export interface DepthColumnsProps {
  columns: readonly GroundColumn[];
  borehole?: BoreholeLog | null;
  /** Water level at the sounding, m. */
  waterLevel?: number | null;
  title?: string;
  note?: string;
  subject?: string;
  /** Height of the bars, px. */
  height?: number;
  selected?: { columnId: string; bed: number } | null;
  onSelectBed?: (columnId: string, bed: number) => void;
  /** Given, the boundaries of a single column can be dragged and moved by arrow keys. */
  onMoveBoundary?: MoveBoundary;
  /** Given, the left and right arrow keys on a bed change its resistivity. */
  onScaleResistivity?: (bed: number, factor: number) => void;
  legend?: boolean;
  className?: string;
}

const SCALES: readonly { value: DepthScaleKind; label: string }[] = [
  { value: 'linear', label: 'Even' },
  { value: 'log', label: 'Log' },
];

const AXIS = 42;
const HEAD = 30;
const FOOT = 20;
const BOREHOLE = 156;

/** Grounds side by side on one depth axis, as soft at each boundary as it is uncertain. */
export function DepthColumns(props: DepthColumnsProps) {
  const {
    columns,
    borehole = null,
    waterLevel = null,
    height = 480,
    title = 'Ground',
    legend = true,
  } = props;
  const palette = useChartPalette();
  const [chosenKind, setKind] = useState<DepthScaleKind | null>(null);
  // cells are even in ln depth, and most of them lie in the first metres
  const kind = chosenKind ?? (columns.some((column) => column.isCells) ? 'log' : 'linear');
  const [ownSelected, setOwnSelected] = useState<DepthColumnsProps['selected']>(null);
  const { ref, size } = useBoxSize<HTMLDivElement>();
  // While a boundary is dragged the depths stay where they are; else the scale would run away from the hand.
  const [heldExtent, setHeldExtent] = useState<ReturnType<typeof depthExtent> | null>(null);
  const ownExtent = useMemo(() => depthExtent(columns, borehole), [columns, borehole]);
  const extent = heldExtent ?? ownExtent;
  const scale = useMemo(() => depthScale(kind, extent, height), [kind, extent, height]);
  const table = useMemo(() => groundTable(columns), [columns]);
  const selected = props.selected === undefined ? ownSelected : props.selected;
  const select = (columnId: string, bed: number) => {
    setOwnSelected({ columnId, bed });
    props.onSelectBed?.(columnId, bed);
  };
  const logWidth = borehole ? BOREHOLE : 0;
  const room = Math.max(0, ...columns.map((column) => labelRoom(column, scale)));
  const leastSlot = NARROWEST_BAR + WHISKER_ROOM + room + 14;
  const slot = Math.max(leastSlot, (size.width - AXIS - logWidth) / Math.max(1, columns.length));
  const width = AXIS + slot * columns.length + logWidth;
  const head = columns.some((column) => column.letter !== '') || borehole ? HEAD : 12;
  return (
    <ChartFrame
      title={title}
      note={props.note ?? 'Ω·m, depth in m'}
      table={table}
      actions={<Segmented label={`${title}: depth scale`} value={kind} options={SCALES} onChange={setKind} />}
      {...(props.subject ? { subject: props.subject } : {})}
      {...(props.className ? { className: props.className } : {})}
    >
      <div ref={ref} className="min-w-0 overflow-x-auto">
        {size.width > 0 ? (
          <svg
            width={width}
            height={height + head + FOOT}
            onPointerDown={() => setHeldExtent(ownExtent)}
            onPointerUp={() => setHeldExtent(null)}
            onPointerCancel={() => setHeldExtent(null)}
            className="block select-none"
          >
            <g transform={`translate(0 ${head})`}>
              <DepthAxis scale={scale} x={AXIS} width={width - AXIS} palette={palette} />
              {columns.map((column, index) => (
                <ColumnSlot
                  key={column.id}
                  column={column}
                  scale={scale}
                  x={AXIS + index * slot}
                  width={slot}
                  palette={palette}
                  selectedBed={selected?.columnId === column.id ? selected.bed : null}
                  onSelectBed={(bed) => select(column.id, bed)}
                  onMoveBoundary={props.onMoveBoundary}
                  onScaleResistivity={props.onScaleResistivity}
                />
              ))}
              {waterLevel === null ? null : (
                <WaterMark x={AXIS} y={scale.yOf(waterLevel)} palette={palette} />
              )}
              {borehole ? (
                <g>
                  <text x={width - logWidth + 10} y={-14} fontSize={13} fontFamily={SANS} fill={palette.ink}>
                    {borehole.name}
                  </text>
                  <BoreholeBar
                    log={borehole}
                    scale={scale}
                    x={width - logWidth + 10}
                    width={logWidth - 10}
                    palette={palette}
                  />
                </g>
              ) : null}
            </g>
          </svg>
        ) : null}
      </div>
      {legend ? <ResistivityLegend className="mt-2" /> : null}
    </ChartFrame>
  );
}
