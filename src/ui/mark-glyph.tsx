import type { ReactNode } from 'react';

/** How far a thing has come, told by shape as well as by colour. */
export type MarkShape = 'empty' | 'part' | 'half' | 'most' | 'full' | 'cross' | 'bar';

/** The mark alone, in a box of 12 by 12, for use within an SVG; drawn in the current colour. */
export function MarkGlyph({ shape }: { shape: MarkShape }) {
  return (
    <>
      <circle cx="6" cy="6" r="5" fill="none" stroke="currentColor" strokeWidth="1.5" />
      {FILL[shape]}
    </>
  );
}

const FILL: Record<MarkShape, ReactNode> = {
  empty: null,
  part: <path d="M6 6V1a5 5 0 0 1 5 5z" fill="currentColor" />,
  half: <path d="M6 1a5 5 0 0 1 0 10z" fill="currentColor" />,
  most: <path d="M6 6V1a5 5 0 1 1 -5 5z" fill="currentColor" />,
  full: <circle cx="6" cy="6" r="5" fill="currentColor" />,
  cross: <path d="M3.6 3.6l4.8 4.8M8.4 3.6L3.6 8.4" stroke="currentColor" strokeWidth="1.5" />,
  bar: <path d="M3 6h6" stroke="currentColor" strokeWidth="2" />,
};
