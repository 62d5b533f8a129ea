import type { ReactNode } from 'react';
import { waterLevelWords } from '../ui/water-level-words';
import { formatGivenLength } from '../ui/format';
import type { BoreholeLog } from './chart-data';
import { haloOf, SANS, type ChartPalette } from './chart-palette';
import type { DepthScale } from './depth-scale';
import { fitText } from './fit-text';
import { svgRole } from './svg-roles';

export interface BoreholeBarProps {
  log: BoreholeLog;
  scale: DepthScale;
  x: number;
  width: number;
  palette: ChartPalette;
}

/** A log beside the columns, on the same depths. */
export function BoreholeBar({ log, scale, x, width, palette }: BoreholeBarProps): ReactNode {
  const shaft = 14;
  return (
    <g {...svgRole('img', boreholeSentence(log))}>
      {log.beds.map((bed, index) => {
        const top = scale.yOf(bed.top);
        const height = scale.yOf(bed.base) - top;
        return (
          <g key={`${bed.top} ${bed.base}`}>
            <rect
              x={x}
              y={top}
              width={shaft}
              height={Math.max(0, height)}
              fill={index % 2 === 0 ? palette.sheet : palette.rule}
              stroke={palette.muted}
            />
            {height >= 13 ? (
              <text
                x={x + shaft + 6}
                y={top + height / 2}
                dy="0.35em"
                fontSize={12}
                fontFamily={SANS}
                fill={palette.ink}
                {...haloOf(palette)}
              >
                {fitText(bed.label, width - shaft - 8)}
                <title>{bed.label}</title>
              </text>
            ) : null}
          </g>
        );
      })}
      {log.waterLevel === undefined || log.waterLevel === null ? null : (
        <WaterMark x={x - 2} y={scale.yOf(log.waterLevel)} palette={palette} />
      )}
    </g>
  );
}

/** The downward triangle of a water level. */
export function WaterMark({ x, y, palette }: { x: number; y: number; palette: ChartPalette }): ReactNode {
  return (
    <g aria-hidden fill={palette.water} stroke={palette.water}>
      <polygon points={`${x - 9},${y - 8} ${x + 1},${y - 8} ${x - 4},${y}`} />
      <line x1={x - 9} x2={x + 1} y1={y + 2.5} y2={y + 2.5} />
    </g>
  );
}

function boreholeSentence(log: BoreholeLog): string {
  const beds = log.beds
    .map((bed) => `${formatGivenLength(bed.top)} to ${formatGivenLength(bed.base)} m ${bed.label}`)
    .join(', ');
  const water =
    log.waterLevel === undefined || log.waterLevel === null
      ? ''
      : `; water ${waterLevelWords(log.waterLevel)}`;
  return `Borehole ${log.name}: ${beds}${water}`;
}
