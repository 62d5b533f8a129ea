import type { KeyboardEvent } from 'react';
import { Link } from 'react-router-dom';
import { MarkGlyph } from '../../ui/mark-glyph';
import { TONE_TEXT } from '../../ui/state-mark';
import { classNames } from '../../ui/class-names';
import type { PlanItem } from './plan-items';
import type { LabelPlace } from './plan-labels';

interface PlanMarkProps {
  item: PlanItem;
  x: number;
  y: number;
  isTabStop: boolean;
  onFocus: () => void;
  onKeyDown: (event: KeyboardEvent) => void;
  /** null where the name would cover another; it then shows on hover and focus. */
  label: LabelPlace | null;
}

export function PlanMark({ item, x, y, isTabStop, onFocus, onKeyDown, label }: PlanMarkProps) {
  const what =
    item.kind === 'borehole'
      ? `Borehole ${item.name}`
      : `Sounding ${item.name}, ${item.look.label.toLowerCase()}`;
  return (
    <Link
      to={item.to}
      tabIndex={isTabStop ? 0 : -1}
      aria-label={what}
      onFocus={onFocus}
      onKeyDown={onKeyDown}
      className="group no-underline outline-none"
    >
      <title>{what}</title>
      <circle
        cx={x}
        cy={y}
        r="12"
        className="fill-transparent group-hover:fill-sunken group-focus-visible:stroke-water group-focus-visible:stroke-2"
      />
      <g transform={`translate(${(x - 6).toFixed(1)} ${(y - 6).toFixed(1)})`}>
        {item.kind === 'borehole' ? (
          // wider than a sounding’s mark, so that one at the same place shows within it
          <path d="M-2.5 -2.5h17v17h-17z" className="fill-none stroke-ink" strokeWidth="1.5" />
        ) : (
          <g className={TONE_TEXT[item.look.tone]}>
            <circle cx="6" cy="6" r="5" className="fill-sheet" />
            <MarkGlyph shape={item.look.shape} />
          </g>
        )}
      </g>
      {label?.isFar ? <path d={leaderPath(x, y, label.dy)} className="fill-none stroke-edge" /> : null}
      <text
        x={x + (label?.dx ?? 0)}
        y={y + (label?.dy ?? -14)}
        textAnchor={label?.anchor ?? 'middle'}
        strokeWidth="3"
        paintOrder="stroke"
        className={classNames(
          'fill-ink stroke-sheet text-xs',
          label === null && 'invisible group-hover:visible group-focus-visible:visible',
        )}
      >
        {item.name}
      </text>
    </Link>
  );
}

/** From the rim of the mark to the name above or below it. */
const leaderPath = (x: number, y: number, dy: number): string =>
  dy < 0
    ? `M${x.toFixed(1)} ${(y - 7).toFixed(1)}V${(y + dy + 4).toFixed(1)}`
    : `M${x.toFixed(1)} ${(y + 7).toFixed(1)}V${(y + dy - 12).toFixed(1)}`;
