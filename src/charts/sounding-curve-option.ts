import type { EChartsOption, XAXisComponentOption, YAXisComponentOption } from 'echarts';
import type { CurveLine, CurvePoint, CurveReading } from './chart-data';
import { MONO, SANS, type ChartPalette } from './chart-palette';
import { branchSeries, curveBranches } from './curve-branches';
import { curveLayout, type CurveLayout, type CurveParts } from './curve-layout';
import { curveSeries } from './curve-lines';
import { curveTooltip } from './curve-tooltip';
import { gridSeries, readingSeries } from './curve-marks';
import { labelledTicks, squareLogAxes, tickLabel, type LogAxes, type LogRange } from './log-axes';
import type { BoxSize } from './use-box-size';
import { residualPoints, residualSeries, STRIP_SIGMA, stripGridSeries } from './residual-strip';

/** What the axes of a drawing have to hold. */
export interface CurveContent {
  readings: readonly CurveReading[];
  lines: readonly CurveLine[];
}

export interface SoundingCurveInput extends CurveContent {
  /** What the axes hold, where several drawings share them; else what is drawn. */
  axesOf?: CurveContent | undefined;
  /** The line whose residuals are shown and that is drawn strongest. */
  chosenLine: string | null;
  focusedReading: number | null;
  /** Name of the x axis with its unit, as "AB/2, m". */
  spacingName: string;
  /** Whole drawing, px. */
  width: number;
  height: number;
  palette: ChartPalette;
}

/** Empty room that a curve may have on both sides together, decades. */
const SPARE_DECADES_DOWN = 0.5;
const SPARE_DECADES_ACROSS = 0.8;
/** A drawing is not made smaller than this to save room, px. */
const LEAST_SIDE = 260;

/**
 * Size of a drawing within a width and a height, px: square decades tie the two, so it is made lower or narrower rather
 * than left half empty. At least 260 either way where there is that much room.
 */
export function curveSize(content: CurveContent, width: number, maxHeight: number): BoxSize {
  const layout = curveLayout(width, maxHeight, partsOf(content));
  const { x, y, pixelsPerDecade } = soundingAxes(content, layout);
  const points = pointsOf(content);
  const trimmed = (whole: number, range: LogRange, values: number[], spareDecades: number) => {
    const needed = decadesOf(values) + spareDecades;
    const spare = Math.max(0, range.max - range.min - needed) * pixelsPerDecade;
    return Math.round(Math.max(Math.min(LEAST_SIDE, whole), whole - spare));
  };
  return {
    width: trimmed(
      width,
      x,
      points.map((point) => point.spacing),
      SPARE_DECADES_ACROSS,
    ),
    height: trimmed(
      maxHeight,
      y,
      points.map((point) => point.apparentResistivity),
      SPARE_DECADES_DOWN,
    ),
  };
}

const partsOf = ({ readings, lines }: CurveContent): CurveParts => ({
  hasStrip: residualLine(lines, null) !== null,
  hasBranches: curveBranches(readings).length > 0,
});

const pointsOf = ({ readings, lines }: CurveContent): CurvePoint[] => [
  ...readings,
  ...lines.filter((line) => line.kind !== 'ghost').flatMap((line) => line.points),
];

function decadesOf(values: readonly number[]): number {
  const logs = values.map(Math.log10).filter(Number.isFinite);
  return logs.length === 0 ? 1 : Math.max(...logs) - Math.min(...logs);
}

/** The line whose residuals the strip shows: the chosen one, or else the first that has any. */
export function residualLine(lines: readonly CurveLine[], chosenLine: string | null): CurveLine | null {
  const withResiduals = lines.filter((line) => line.residuals !== undefined);
  return withResiduals.find((line) => line.id === chosenLine) ?? withResiduals[0] ?? null;
}

/** Apparent resistivity against spacing on log–log axes with square decades, the residuals under it. */
export function soundingCurveOption(input: SoundingCurveInput): EChartsOption {
  const { readings, lines, palette, focusedReading, width, height } = input;
  const shown = residualLine(lines, input.chosenLine);
  const layout = curveLayout(width, height, partsOf(input));
  const axes = soundingAxes(input.axesOf ?? input, layout);
  const strip =
    shown?.residuals && layout.strip
      ? [
          stripGridSeries(palette),
          residualSeries(residualPoints(readings, shown.residuals), palette, focusedReading),
        ]
      : [];
  const branches = branchSeries(readings, palette);
  return {
    animation: false,
    textStyle: { fontFamily: SANS, color: palette.muted },
    grid: [layout.plot, ...(layout.strip ? [layout.strip] : [])],
    xAxis: xAxes(input, axes, layout),
    yAxis: yAxes(axes, layout, palette),
    tooltip: curveTooltip(readings, shown, palette),
    series: [
      gridSeries(axes, palette),
      ...(branches ? [branches] : []),
      ...curveSeries(lines, axes, layout.plot.height, palette, input.chosenLine),
      readingSeries(readings, palette, focusedReading),
      ...strip,
    ],
  };
}

export function soundingAxes(content: CurveContent, { plot }: CurveLayout): LogAxes {
  const points = pointsOf(content);
  const spread = content.readings.flatMap(({ apparentResistivity, relativeError }) => [
    apparentResistivity * Math.exp(relativeError),
    apparentResistivity * Math.exp(-relativeError),
  ]);
  return squareLogAxes(
    points.map((point) => point.spacing),
    [...spread, ...points.map((point) => point.apparentResistivity)],
    plot.width,
    plot.height,
  );
}

const labelStyle = (palette: ChartPalette) => ({ fontFamily: MONO, fontSize: 12, color: palette.muted });

function logAxis(range: LogRange, pixelsPerDecade: number, labelWidth: number, palette: ChartPalette) {
  const positions = labelledTicks(range, pixelsPerDecade, labelWidth).map((tick) => tick.position);
  return {
    type: 'value' as const,
    min: range.min,
    max: range.max,
    splitLine: { show: false },
    axisTick: { show: true, customValues: positions, length: 4, lineStyle: { color: palette.muted } },
    axisLabel: { ...labelStyle(palette), customValues: positions, formatter: tickLabel, margin: 8 },
    axisPointer: { show: false },
  };
}

function xAxes(input: SoundingCurveInput, axes: LogAxes, layout: CurveLayout): XAXisComponentOption[] {
  const { palette, spacingName } = input;
  const name = {
    name: spacingName,
    nameLocation: 'end' as const,
    nameGap: 0,
    nameTextStyle: {
      color: palette.muted,
      fontSize: 13,
      align: 'right' as const,
      verticalAlign: 'top' as const,
      padding: [layout.strip ? 8 : 24, 0, 0, 0],
    },
  };
  const line = { show: true, onZero: false, lineStyle: { color: palette.muted } };
  const main = { ...logAxis(axes.x, axes.pixelsPerDecade, 30, palette), gridIndex: 0, axisLine: line };
  if (!layout.strip) return [{ ...main, ...name }];
  return [
    main,
    {
      ...logAxis(axes.x, axes.pixelsPerDecade, 30, palette),
      ...name,
      gridIndex: 1,
      axisLine: { show: false, onZero: false },
      axisTick: { show: false },
      axisLabel: { show: false },
    },
  ];
}

function yAxes(axes: LogAxes, layout: CurveLayout, palette: ChartPalette): YAXisComponentOption[] {
  const line = { show: true, onZero: false, lineStyle: { color: palette.muted } };
  const main = { ...logAxis(axes.y, axes.pixelsPerDecade, 14, palette), gridIndex: 0, axisLine: line };
  if (!layout.strip) return [main];
  const sigmas = [-2, 0, 2];
  return [
    main,
    {
      type: 'value',
      gridIndex: 1,
      min: -STRIP_SIGMA - 0.4,
      max: STRIP_SIGMA + 0.4,
      splitLine: { show: false },
      axisLine: { show: false },
      axisTick: { show: false },
      axisLabel: {
        ...labelStyle(palette),
        margin: 12,
        customValues: sigmas,
        formatter: (sigma: number) =>
          sigma === 0 ? '0' : `${sigma > 0 ? '+' : '\u2212'}${Math.abs(sigma)}σ`,
      },
      axisPointer: { show: false },
    },
  ];
}
