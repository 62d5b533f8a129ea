import type { ReactNode } from 'react';
import { formatCount, formatLength, withUnit } from '../ui/format';
import { BoundaryMarks, type MoveBoundary } from './boundary-marks';
import type { GroundColumn } from './chart-data';
import { MONO, SANS, type ChartPalette } from './chart-palette';
import type { DepthScale } from './depth-scale';
import { fitText } from './fit-text';
import { GroundBar } from './ground-bar';
import { GroundLabels, labelRoom } from './ground-labels';
import { groundBoundaries } from './ground-profile';
import { runStyle } from './run-style';
import { svgRole } from './svg-roles';

export interface ColumnSlotProps {
  column: GroundColumn;
  scale: DepthScale;
  x: number;
  width: number;
  palette: ChartPalette;
  selectedBed: number | null;
  onSelectBed: (bed: number) => void;
  onMoveBoundary?: MoveBoundary | undefined;
  onScaleResistivity?: ((bed: number, factor: number) => void) | undefined;
}

const WIDEST_BAR = 92;
export const NARROWEST_BAR = 44;
/** From the bar's end to its words, where whiskers and handles stand, px. */
export const WHISKER_ROOM = 22;

/** One ground with its letter, its bar, its intervals and the depth its data reach. */
export function ColumnSlot(props: ColumnSlotProps): ReactNode {
  const { column, scale, x, width, palette, onMoveBoundary } = props;
  const barWidth = barWidthOf(props);
  const barEnd = x + barWidth;
  const reach = column.depthOfInvestigation ?? null;
  return (
    <g {...svgRole('group', columnSentence(column))}>
      {column.letter === '' ? null : (
        <text x={x} y={-14} fontSize={13}>
          <title>{column.name}</title>
          <tspan fontFamily={MONO} fontWeight={600} fill={runStyle(column.letter, palette).color}>
            {column.letter}
          </tspan>
          <tspan dx={8} fontFamily={SANS} fill={palette.ink}>
            {fitText(column.name, width - 30)}
          </tspan>
        </text>
      )}
      <GroundBar {...props} width={barWidth} onScaleResistivity={props.onScaleResistivity} />
      <BoundaryMarks
        boundaries={column.isCells ? [] : groundBoundaries(column)}
        scale={scale}
        x={barEnd}
        barX={x}
        palette={palette}
        isFaint={column.isRejected}
        onMove={onMoveBoundary}
      />
      <GroundLabels
        column={column}
        scale={scale}
        x={barEnd + WHISKER_ROOM}
        barEnd={barEnd}
        width={x + width - barEnd - WHISKER_ROOM - 6}
        palette={palette}
      />
      {reach !== null && reach < scale.maxDepth ? (
        <g aria-hidden>
          <line
            x1={x}
            x2={barEnd}
            y1={scale.yOf(reach)}
            y2={scale.yOf(reach)}
            stroke={palette.muted}
            strokeDasharray="4 3"
          />
          <text x={x} y={scale.height + 15} fontSize={12} fontFamily={SANS} fill={palette.muted}>
            below {withUnit(formatLength(reach), 'm')}: little seen
          </text>
        </g>
      ) : null}
    </g>
  );
}

/** The bar yields to the numbers beside it. */
function barWidthOf({ column, scale, width }: ColumnSlotProps): number {
  const left = width - WHISKER_ROOM - labelRoom(column, scale) - 6;
  return Math.min(WIDEST_BAR, Math.max(NARROWEST_BAR, Math.min(width * 0.36, left)));
}

function columnSentence(column: GroundColumn): string {
  const name = column.letter === '' ? column.name : `Run ${column.letter}, ${column.name}`;
  const reach = column.depthOfInvestigation
    ? `; the data reach about ${withUnit(formatLength(column.depthOfInvestigation), 'm')}`
    : '';
  return `${name}: ${formatCount(column.earth.resistivity.length, column.isCells ? 'cell' : 'bed')}${reach}`;
}
