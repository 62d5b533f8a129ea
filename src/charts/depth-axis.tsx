import type { ReactNode } from 'react';
import { MONO, type ChartPalette } from './chart-palette';
import type { DepthScale } from './depth-scale';

/** Depths at the left, with light rules across the drawing. */
export function DepthAxis({
  scale,
  x,
  width,
  palette,
}: {
  scale: DepthScale;
  x: number;
  width: number;
  palette: ChartPalette;
}): ReactNode {
  return (
    <g aria-hidden>
      {scale.ticks.map((tick) => (
        <g key={tick.depth} transform={`translate(0 ${tick.y})`}>
          <line x1={x} x2={x + width} stroke={palette.rule} />
          <line x1={x - 6} x2={x} stroke={palette.muted} />
          <text x={x - 10} dy="0.35em" textAnchor="end" fontSize={12} fontFamily={MONO} fill={palette.muted}>
            {tick.label}
          </text>
        </g>
      ))}
    </g>
  );
}
