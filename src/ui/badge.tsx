import type { ReactNode } from 'react';
import { classNames } from './class-names';

export type Tone = 'neutral' | 'water' | 'copper' | 'rust';

const TONE: Record<Tone, string> = {
  neutral: 'border-rule bg-sunken text-ink',
  water: 'border-water/40 bg-water-tint text-ink',
  copper: 'border-copper/40 bg-copper-tint text-ink',
  rust: 'border-rust/40 bg-rust-tint text-ink',
};

export function Badge({ tone = 'neutral', children }: { tone?: Tone; children: ReactNode }) {
  return (
    <span
      className={classNames(
        'inline-flex items-center align-middle rounded-sm border px-1.5 text-xs leading-5 whitespace-nowrap',
        TONE[tone],
      )}
    >
      {children}
    </span>
  );
}
