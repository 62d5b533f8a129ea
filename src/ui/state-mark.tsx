import type { Tone } from './badge';
import { classNames } from './class-names';
import { MarkGlyph, type MarkShape } from './mark-glyph';

export interface StateMarkProps {
  shape: MarkShape;
  tone?: Tone;
  label: string;
  /** Shows the mark alone; the label is still said. */
  compact?: boolean;
}

export const TONE_TEXT: Record<Tone, string> = {
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
        className={classNames('shrink-0', TONE_TEXT[tone])}
      >
        <MarkGlyph shape={shape} />
      </svg>
      <span className={compact ? 'sr-only' : undefined}>{label}</span>
    </span>
  );
}
