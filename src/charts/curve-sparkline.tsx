import type { CurvePoint } from './chart-data';
import { logTicks, squareLogAxes } from './log-axes';

export interface CurveSparklineProps {
  readings: readonly (CurvePoint & { excluded?: boolean })[];
  /** What the chosen fit predicts, in order of spacing. */
  fitted?: readonly CurvePoint[] | null;
  /** Said in place of the drawing, as "Curve of S-07". */
  label: string;
  width?: number;
  height?: number;
}

/** A curve in the size of a table row: readings as dots, the fit as a line, decades square. */
export function CurveSparkline({ readings, fitted, label, width = 96, height = 30 }: CurveSparklineProps) {
  const used = readings.filter((reading) => reading.spacing > 0 && reading.apparentResistivity > 0);
  const axes = squareLogAxes(
    used.map((reading) => reading.spacing),
    used.map((reading) => reading.apparentResistivity),
    width,
    height,
  );
  const x = (spacing: number) => round((Math.log10(spacing) - axes.x.min) * axes.pixelsPerDecade);
  const y = (value: number) => round(height - (Math.log10(value) - axes.y.min) * axes.pixelsPerDecade);
  const line = (fitted ?? []).map((point) => `${x(point.spacing)},${y(point.apparentResistivity)}`).join(' ');
  return (
    <svg
      role="img"
      aria-label={label}
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className="block"
    >
      {logTicks(axes.x)
        .filter((tick) => tick.isDecade)
        .map((tick) => (
          <line
            key={tick.position}
            x1={x(tick.value)}
            x2={x(tick.value)}
            y1={0}
            y2={height}
            stroke="var(--rule)"
          />
        ))}
      {line === '' ? null : (
        <polyline points={line} fill="none" stroke="var(--water)" strokeWidth={1.5} strokeLinejoin="round" />
      )}
      {used.map((reading, index) => (
        <circle
          key={index}
          cx={x(reading.spacing)}
          cy={y(reading.apparentResistivity)}
          r={1.5}
          fill={reading.excluded ? 'none' : 'var(--ink)'}
          stroke="var(--ink)"
          strokeWidth={reading.excluded ? 0.8 : 0}
        />
      ))}
    </svg>
  );
}

const round = (value: number) => Number(value.toFixed(1));
