import { useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react';
import { formatLength } from '../ui/format';
import type { ChartPalette } from './chart-palette';
import type { DepthScale } from './depth-scale';
import type { GroundBoundary } from './ground-profile';
import { svgRole } from './svg-roles';

/** Moves boundary `boundary` to a depth in m; the moves of one drag share a gesture. */
export type MoveBoundary = (boundary: number, depth: number, gesture: string) => void;

export interface BoundaryMarksProps {
  boundaries: readonly GroundBoundary[];
  scale: DepthScale;
  /** Right edge of the bar. */
  x: number;
  /** Left edge of the bar. */
  barX: number;
  palette: ChartPalette;
  /** Draws the intervals faintly. */
  isFaint?: boolean | undefined;
  onMove?: MoveBoundary | undefined;
}

/** The 95 % interval of each boundary as a whisker along the bar's edge, and its handle where it can be moved. */
export function BoundaryMarks({ boundaries, onMove, ...place }: BoundaryMarksProps): ReactNode {
  return boundaries.map((boundary) => (
    <g key={boundary.index}>
      <Whisker {...place} boundary={boundary} />
      {onMove ? <Handle {...place} boundary={boundary} onMove={onMove} /> : null}
    </g>
  ));
}

function Whisker({
  boundary,
  scale,
  x,
  palette,
  isFaint = false,
}: Omit<BoundaryMarksProps, 'boundaries'> & { boundary: GroundBoundary }) {
  if (boundary.rangeText === '') return null;
  const top = boundary.low === null ? 0 : scale.yOf(boundary.low);
  const base = boundary.high === null ? scale.height : scale.yOf(boundary.high);
  const dash = boundary.low === null || boundary.high === null ? '2 3' : undefined;
  const reach = 2 + (boundary.index % 2) * 4;
  return (
    <g aria-hidden stroke={isFaint ? palette.muted : palette.copper} strokeWidth={isFaint ? 1 : 1.4}>
      <line x1={x + reach} x2={x + reach} y1={top} y2={base} strokeDasharray={dash} />
      {boundary.low === null ? null : <line x1={x + reach - 2} x2={x + reach + 2} y1={top} y2={top} />}
      {boundary.high === null ? null : <line x1={x + reach - 2} x2={x + reach + 2} y1={base} y2={base} />}
      <line x1={x} x2={x + reach} y1={scale.yOf(boundary.depth)} y2={scale.yOf(boundary.depth)} />
    </g>
  );
}

interface HandleProps extends Omit<BoundaryMarksProps, 'boundaries'> {
  boundary: GroundBoundary;
  onMove: MoveBoundary;
}

function Handle({ boundary, scale, x, barX, palette, onMove }: HandleProps) {
  const drag = useRef<{ pointer: number; offset: number; gesture: string } | null>(null);
  const y = scale.yOf(boundary.depth);
  const localY = (event: PointerEvent<SVGGElement>) => {
    const svg = event.currentTarget.ownerSVGElement;
    const matrix = event.currentTarget.getScreenCTM();
    if (!svg || !matrix) return y;
    return new DOMPoint(event.clientX, event.clientY).matrixTransform(matrix.inverse()).y;
  };
  const onPointerDown = (event: PointerEvent<SVGGElement>) => {
    event.currentTarget.setPointerCapture(event.pointerId);
    drag.current = {
      pointer: event.pointerId,
      offset: localY(event) - y,
      gesture: `drag ${boundary.index} ${event.timeStamp}`,
    };
  };
  const onPointerMove = (event: PointerEvent<SVGGElement>) => {
    const held = drag.current;
    if (held?.pointer !== event.pointerId) return;
    const wanted = Math.min(scale.height, Math.max(0, localY(event) - held.offset));
    onMove(boundary.index, scale.depthAt(wanted), held.gesture);
  };
  const release = () => {
    drag.current = null;
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const direction = { ArrowDown: 1, ArrowUp: -1, ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (direction === undefined) return;
    event.preventDefault();
    const factor = (event.shiftKey ? 1.2 : 1.02) ** direction;
    onMove(boundary.index, boundary.depth * factor, `key ${boundary.index} ${event.timeStamp}`);
  };
  return (
    <g
      {...svgRole('slider', `Base of bed ${boundary.index + 1}`)}
      tabIndex={0}
      aria-orientation="vertical"
      aria-valuemin={0}
      aria-valuemax={Number(scale.maxDepth.toPrecision(3))}
      aria-valuenow={Number(boundary.depth.toPrecision(4))}
      aria-valuetext={`${formatLength(boundary.depth)} metres`}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={release}
      onPointerCancel={release}
      onKeyDown={onKeyDown}
      data-screen-only
      className="group cursor-ns-resize touch-none outline-none"
    >
      <rect x={barX} y={y - 5} width={x - barX} height={10} fill="transparent" />
      <circle cx={x} cy={y} r={13} fill="transparent" />
      <circle
        cx={x}
        cy={y}
        r={5.5}
        fill={palette.sheet}
        stroke={palette.copper}
        strokeWidth={1.8}
        className="group-hover:stroke-[2.6px]"
      />
      <circle
        cx={x}
        cy={y}
        r={10}
        fill="none"
        stroke={palette.water}
        strokeWidth={2}
        className="opacity-0 group-focus-visible:opacity-100"
      />
    </g>
  );
}
