import type { LineSeriesOption } from 'echarts';
import type { CurveLine } from './chart-data';
import { MONO, type ChartPalette } from './chart-palette';
import type { LogAxes } from './log-axes';
import { placeLabels } from './place-labels';
import { runStyle } from './run-style';

/** Letters at the ends of curves stand at least this far apart, px. */
const LETTER_GAP = 15;

/** Curves of runs with their letter at the right end; a hand model in copper, what stood before it as a ghost. */
export function curveSeries(
  lines: readonly CurveLine[],
  axes: LogAxes,
  plotHeight: number,
  palette: ChartPalette,
  chosen: string | null,
): LineSeriesOption[] {
  const lettered = lines.filter((line) => line.letter !== '' && line.points.length > 0);
  const offsets = letterOffsets(lettered, axes, plotHeight);
  return lines.map((line) => ({
    id: `curve-${line.id}`,
    name: line.letter === '' ? line.name : `${line.letter}, ${line.name}`,
    type: 'line',
    xAxisIndex: 0,
    yAxisIndex: 0,
    showSymbol: false,
    silent: true,
    animation: false,
    z: line.kind === 'ghost' ? 2 : line.id === chosen ? 4 : 3,
    data: lineData(line),
    lineStyle: lineStyle(line, palette, line.id === chosen),
    itemStyle: { color: lineColor(line, palette) },
    endLabel: {
      show: line.letter !== '',
      formatter: line.letter,
      color: lineColor(line, palette),
      fontFamily: MONO,
      fontWeight: 600,
      fontSize: 13,
      distance: 8,
      offset: [0, offsets.get(line.id) ?? 0],
    },
    labelLayout: { hideOverlap: false },
  }));
}

/** Points in decades, with a gap before each branch that is not drawn through. */
function lineData({ points }: CurveLine): (number | null)[][] {
  return points.flatMap((point) => {
    const place = [Math.log10(point.spacing), Math.log10(point.apparentResistivity)];
    return point.startsBranch ? [[place[0] ?? null, null], place] : [place];
  });
}

function lineColor(line: CurveLine, palette: ChartPalette): string {
  if (line.kind === 'hand') return palette.copper;
  if (line.kind === 'ghost') return palette.muted;
  return runStyle(line.letter, palette).color;
}

function lineStyle(line: CurveLine, palette: ChartPalette, isChosen: boolean): LineSeriesOption['lineStyle'] {
  const color = lineColor(line, palette);
  if (line.kind === 'hand') return { color, width: 2.4, type: 'solid' };
  if (line.kind === 'ghost') return { color, width: 1.2, type: [2, 4], opacity: 0.8 };
  const { dash } = runStyle(line.letter, palette);
  return { color, width: isChosen ? 2.4 : 1.6, type: dash.length === 0 ? 'solid' : [...dash] };
}

/** How far to move each letter (px, down) so that curves that end together keep readable names inside the plot. */
function letterOffsets(lines: readonly CurveLine[], axes: LogAxes, plotHeight: number): Map<string, number> {
  const wishes = lines.map((line) => ({
    y: (axes.y.max - Math.log10(line.points.at(-1)?.apparentResistivity ?? 1)) * axes.pixelsPerDecade,
    height: LETTER_GAP,
  }));
  const middles = placeLabels(wishes, 0, plotHeight);
  return new Map(lines.map((line, index) => [line.id, (middles[index] ?? 0) - (wishes[index]?.y ?? 0)]));
}
