import { useId, type KeyboardEvent, type ReactNode } from 'react';
import { formatResistivity } from '../ui/format';
import type { GroundColumn } from './chart-data';
import { MONO, type ChartPalette } from './chart-palette';
import type { DepthScale } from './depth-scale';
import { bedSentence, groundBeds, type GroundBed } from './ground-profile';
import { colorBehind, profileStops } from './ground-softness';
import { textColorOn } from './resistivity-ramp';
import { svgRole } from './svg-roles';

/** A bed lower than this has its number beside it, px. */
export const LEAST_NUMBER_HEIGHT = 17;

/** A bed is never drawn lower than this, px. */
const LEAST_DRAWN_HEIGHT = 4;

export interface GroundBarProps {
  column: GroundColumn;
  scale: DepthScale;
  x: number;
  width: number;
  palette: ChartPalette;
  selectedBed: number | null;
  onSelectBed: (bed: number) => void;
  /** Arrow keys to the left and right on a bed: its resistivity times this. */
  onScaleResistivity?: ((bed: number, factor: number) => void) | undefined;
}

/** The column itself: one soft colour field, and over it the beds one can reach, with their numbers. */
export function GroundBar(props: GroundBarProps): ReactNode {
  const { column, scale, x, width, palette, selectedBed } = props;
  const gradientId = useId();
  const beds = groundBeds(column);
  return (
    <g>
      <defs>
        <linearGradient id={gradientId} x1={0} y1={0} x2={0} y2={1}>
          {profileStops(column, scale).map((stop) => (
            <stop key={stop.offset} offset={stop.offset} stopColor={stop.color} stopOpacity={stop.opacity} />
          ))}
        </linearGradient>
      </defs>
      <rect x={x} y={0} width={width} height={scale.height} fill={`url(#${gradientId})`} />
      {boundariesOf(column).map((_, index) => {
        const y = scale.yOf(beds[index]?.base ?? 0);
        return <line key={index} x1={x} x2={x + width} y1={y} y2={y} stroke="#ffffff" strokeOpacity={0.75} />;
      })}
      {beds
        .filter((bed) => !column.isCells && isThin(bed, scale))
        .map((bed) => (
          <ThinBed key={bed.index} bed={bed} scale={scale} x={x} width={width} />
        ))}
      <rect x={x} y={0} width={width} height={scale.height} fill="none" stroke={palette.ruleStrong} />
      {beds.map((bed) => (
        <Bed key={bed.index} {...props} bed={bed} isSelected={bed.index === selectedBed} />
      ))}
    </g>
  );
}

/** Cells stand on one another without a line between. */
const boundariesOf = ({ earth, isCells }: GroundColumn) => (isCells ? [] : earth.thickness);

const heightOf = (bed: GroundBed, scale: DepthScale): number =>
  (bed.base === null ? scale.height : scale.yOf(bed.base)) - scale.yOf(bed.top);

const isThin = (bed: GroundBed, scale: DepthScale): boolean => heightOf(bed, scale) < LEAST_DRAWN_HEIGHT;

/** A bed too thin for the scale, at the least height that is seen, in its own colour. */
function ThinBed({
  bed,
  scale,
  x,
  width,
}: Pick<GroundBarProps, 'scale' | 'x' | 'width'> & { bed: GroundBed }) {
  const middle = scale.yOf(bed.top) + heightOf(bed, scale) / 2;
  const top = Math.min(Math.max(0, middle - LEAST_DRAWN_HEIGHT / 2), scale.height - LEAST_DRAWN_HEIGHT);
  return (
    <rect
      x={x}
      y={top}
      width={width}
      height={LEAST_DRAWN_HEIGHT}
      fill={bed.color}
      stroke="#ffffff"
      strokeOpacity={0.75}
    />
  );
}

function Bed({ bed, isSelected, ...props }: GroundBarProps & { bed: GroundBed; isSelected: boolean }) {
  const { scale, x, width, palette, onSelectBed, onScaleResistivity } = props;
  const top = scale.yOf(bed.top);
  const base = bed.base === null ? scale.height : scale.yOf(bed.base);
  const select = () => onSelectBed(bed.index);
  const onKeyDown = (event: KeyboardEvent) => {
    const direction = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (event.key === 'Enter' || event.key === ' ') select();
    else if (direction !== undefined && onScaleResistivity)
      onScaleResistivity(bed.index, (event.shiftKey ? 1.2 : 1.02) ** direction);
    else return;
    event.preventDefault();
  };
  return (
    <g
      {...svgRole('button', bedSentence(bed))}
      tabIndex={0}
      aria-pressed={isSelected}
      onClick={select}
      onKeyDown={onKeyDown}
      className="group cursor-pointer outline-none"
    >
      <rect
        x={x + 1}
        y={top + 1}
        width={width - 2}
        height={Math.max(1, base - top - 2)}
        fill="transparent"
        stroke={isSelected ? palette.copper : 'none'}
        strokeWidth={2}
      />
      <rect
        data-screen-only
        x={x - 2}
        y={top - 2}
        width={width + 4}
        height={base - top + 4}
        fill="none"
        stroke={palette.water}
        strokeWidth={2}
        className="opacity-0 group-focus-visible:opacity-100"
      />
      {base - top >= LEAST_NUMBER_HEIGHT ? <BedNumber {...props} bed={bed} top={top} base={base} /> : null}
    </g>
  );
}

/** In the part of the bed that is still opaque, to be read on the colour that is there. */
function BedNumber({
  bed,
  column,
  scale,
  x,
  width,
  palette,
  top,
  base,
}: GroundBarProps & { bed: GroundBed; top: number; base: number }) {
  const opaqueEnd = column.depthOfInvestigation ? scale.yOf(column.depthOfInvestigation) : scale.height;
  const visibleBase = opaqueEnd - top >= LEAST_NUMBER_HEIGHT ? Math.min(base, opaqueEnd) : base;
  const y = (top + visibleBase) / 2;
  return (
    <text
      aria-hidden
      x={x + width / 2}
      y={y}
      dy="0.35em"
      textAnchor="middle"
      fontSize={13}
      fontWeight={600}
      fontFamily={MONO}
      fill={textColorOn(colorBehind(column, scale, y, palette.paper))}
      pointerEvents="none"
    >
      {formatResistivity(bed.resistivity)}
    </text>
  );
}
