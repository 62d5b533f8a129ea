import type { ReactNode } from 'react';
import { classNames } from './class-names';
import type { Tone } from './badge';

/** How far a thing has come, told by shape as well as by colour. */
export type MarkShape = 'empty' | 'part' | 'half' | 'full' | 'cross';

export interface StateMarkProps {
  shape: MarkShape;
  tone?: Tone;
  label: string;
  /** Shows the mark alone; the label is still said. */
  compact?: boolean;
}

const TONE: Record<Tone, string> = {
  neutral: 'text-muted',
  water: 'text-water',
  copper: 'text-copper',
  rust: 'text-rust',
};

export function StateMark({ shape, tone = 'neutral', label, compact = false }: StateMarkProps) {
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <svg
        aria-hidden
        viewBox="0 0 12 12"
        width="12"
        height="12"
        className={classNames('shrink-0', TONE[tone])}
      >
        <circle cx="6" cy="6" r="5" fill="none" stroke="currentColor" strokeWidth="1.5" />
        {FILL[shape]}
      </svg>
      <span className={compact ? 'sr-only' : undefined}>{label}</span>
    </span>
  );
}

const FILL: Record<MarkShape, ReactNode> = {
  empty: null,
  part: <path d="M6 6V1a5 5 0 0 1 5 5z" fill="currentColor" />,
  half: <path d="M6 1a5 5 0 0 1 0 10z" fill="currentColor" />,
  full: <circle cx="6" cy="6" r="5" fill="currentColor" />,
  cross: <path d="M3.6 3.6l4.8 4.8M8.4 3.6L3.6 8.4" stroke="currentColor" strokeWidth="1.5" />,
};
