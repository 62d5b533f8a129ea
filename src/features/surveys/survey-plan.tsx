import { useMemo, useRef, useState, type KeyboardEvent } from 'react';
import { useBoxSize } from '../../charts/use-box-size';
import { withUnit } from '../../ui/format';
import { placeLabels } from './plan-labels';
import { alongLine, planHeight, planLayout } from './plan-layout';
import { PlanMark } from './plan-mark';
import type { PlanItem } from './plan-items';

interface SurveyPlanProps {
  items: readonly PlanItem[];
  /** What "up" is, as "y up" or "north up". */
  upward: string;
}

const MARGIN = 48;
/** On a narrower plan, lines that lead to names crowd it more than the names tell; a touch shows them. */
const ROOM_FOR_FAR_NAMES_PX = 560;

/** Positions on one scale for both axes. One tab stop; the arrow keys go from mark to mark. */
export function SurveyPlan({ items, upward }: SurveyPlanProps) {
  const { ref: frame, size } = useBoxSize<HTMLElement>();
  const { width } = size;
  const [current, setCurrent] = useState(0);
  const drawing = useRef<SVGSVGElement>(null);
  const height = planHeight(items, { width, margin: MARGIN });
  const layout = useMemo(
    () => (width === 0 ? null : planLayout(items, { width, height, margin: MARGIN })),
    [items, width, height],
  );
  const move = (event: KeyboardEvent) => {
    const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = (current + step + items.length) % items.length;
    setCurrent(next);
    drawing.current?.querySelectorAll('a')[next]?.focus();
  };
  if (layout === null) return <nav ref={frame} aria-label="Plan" style={{ height }} />;
  const placed = items.map((item) => ({ item, ...layout.toPage(item) }));
  const places = placeLabels(
    placed.map(({ item, x, y }) => ({ name: item.name, x, y })),
    width >= ROOM_FOR_FAR_NAMES_PX,
  );
  return (
    <nav ref={frame} aria-label={`Plan of ${items.length} positions, ${upward} upwards`}>
      <svg ref={drawing} width={width} height={height} className="block border border-rule bg-sheet">
        <LinePaths items={items} toPage={layout.toPage} />
        {placed.map(({ item, x, y }, i) => (
          <PlanMark
            key={`${item.kind} ${item.id}`}
            item={item}
            x={x}
            y={y}
            isTabStop={i === current}
            onFocus={() => setCurrent(i)}
            onKeyDown={move}
            label={places[i] ?? null}
          />
        ))}
        <ScaleBar {...layout.scaleBar} height={height} />
        <text x={width - 12} y={20} textAnchor="end" className="fill-muted text-xs">
          {upward} ↑
        </text>
      </svg>
    </nav>
  );
}

interface LinePathsProps {
  items: readonly PlanItem[];
  toPage: (point: PlanItem) => { x: number; y: number };
}

function LinePaths({ items, toPage }: LinePathsProps) {
  const names = new Set(items.map((item) => item.lineName).filter((name) => name !== null));
  return [...names].map((name) => {
    const ends = alongLine(items.filter((item) => item.lineName === name)).map(toPage);
    const [first] = ends;
    if (!first || ends.length < 2) return null;
    return (
      <g key={name}>
        <polyline
          points={ends.map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`).join(' ')}
          className="fill-none stroke-edge"
          strokeDasharray="5 4"
        />
        <text x={first.x - 14} y={first.y + 4} textAnchor="end" className="fill-muted text-xs">
          {name}
        </text>
      </g>
    );
  });
}

function ScaleBar({ lengthM, pixels, height }: { lengthM: number; pixels: number; height: number }) {
  const y = height - 14;
  const words = lengthM >= 1000 ? withUnit(String(lengthM / 1000), 'km') : withUnit(String(lengthM), 'm');
  return (
    <g aria-label={`Scale bar of ${words}`}>
      <path
        d={`M14 ${y - 5}V${y}H${14 + pixels}V${y - 5}`}
        className="fill-none stroke-ink"
        strokeWidth="1.5"
      />
      <text x={14 + pixels / 2} y={y - 5} textAnchor="middle" className="figure fill-ink text-xs">
        {words}
      </text>
    </g>
  );
}
