import type { CustomSeriesOption } from 'echarts';
import type { CurveReading } from './chart-data';
import type { ChartPalette } from './chart-palette';

type RenderItem = NonNullable<CustomSeriesOption['renderItem']>;

/** The strip shows ± this many standard errors; what lies beyond stands at its edge as an arrow. */
export const STRIP_SIGMA = 4;

export interface ResidualPoint {
  /** Index into the readings. */
  reading: number;
  spacing: number;
  residual: number;
}

/** The residuals that exist, of the readings that take part. */
export function residualPoints(
  readings: readonly CurveReading[],
  residuals: readonly (number | null)[],
): ResidualPoint[] {
  return readings.flatMap((reading, index) => {
    const residual = residuals[index] ?? null;
    if (reading.excluded || residual === null || !Number.isFinite(residual)) return [];
    return [{ reading: index, spacing: reading.spacing, residual }];
  });
}

/** ±1σ band, ±2σ lines and zero, across the whole strip. */
export function stripGridSeries(palette: ChartPalette): CustomSeriesOption {
  const render: RenderItem = (params, api) => {
    const box = params.coordSys as unknown as { x: number; y: number; width: number; height: number };
    const yOf = (sigma: number) => Math.round(api.coord([0, sigma])[1] ?? 0);
    const line = (sigma: number, stroke: string, lineDash?: number[]) => ({
      type: 'line' as const,
      shape: { x1: box.x, y1: yOf(sigma), x2: box.x + box.width, y2: yOf(sigma) },
      style: { stroke, lineWidth: 1, ...(lineDash ? { lineDash } : {}) },
    });
    return {
      type: 'group',
      children: [
        {
          type: 'rect' as const,
          shape: { x: box.x, y: yOf(1), width: box.width, height: yOf(-1) - yOf(1) },
          style: { fill: palette.waterTint },
        },
        line(2, palette.ruleStrong, [3, 3]),
        line(-2, palette.ruleStrong, [3, 3]),
        line(0, palette.muted),
      ],
    };
  };
  return {
    id: 'strip-grid',
    type: 'custom',
    xAxisIndex: 1,
    yAxisIndex: 1,
    silent: true,
    z: 0,
    data: [[0, 0]],
    renderItem: render,
  };
}

/** One stalk a reading from zero; beyond 2σ in rust. */
export function residualSeries(
  points: readonly ResidualPoint[],
  palette: ChartPalette,
  focused: number | null,
): CustomSeriesOption {
  const render: RenderItem = (params, api) => {
    const point = points[params.dataIndex];
    if (!point) return null;
    const shown = Math.max(-STRIP_SIGMA, Math.min(STRIP_SIGMA, point.residual));
    const [x = 0, y = 0] = api.coord([Number(api.value(0)), shown]);
    const zero = api.coord([Number(api.value(0)), 0])[1] ?? y;
    const color = Math.abs(point.residual) > 2 ? palette.rust : palette.ink;
    const isFocused = point.reading === focused;
    const stalk = {
      type: 'line' as const,
      shape: { x1: x, y1: zero, x2: x, y2: y },
      style: { stroke: color, lineWidth: 1.4 },
    };
    const head =
      shown === point.residual
        ? {
            type: 'circle' as const,
            shape: { cx: x, cy: y, r: isFocused ? 4.5 : 2.8 },
            style: { fill: color, stroke: isFocused ? palette.copper : color, lineWidth: 1.5 },
          }
        : {
            type: 'polygon' as const,
            shape: { points: arrow(x, y, Math.sign(point.residual)) },
            style: { fill: color },
          };
    return { type: 'group', children: [stalk, head] };
  };
  return {
    id: 'residuals',
    name: 'Residuals',
    type: 'custom',
    xAxisIndex: 1,
    yAxisIndex: 1,
    z: 4,
    data: points.map((point) => [Math.log10(point.spacing), point.residual]),
    renderItem: render,
  };
}

function arrow(x: number, y: number, direction: number): [number, number][] {
  return [
    [x - 4.5, y + 4 * direction],
    [x + 4.5, y + 4 * direction],
    [x, y - 4 * direction],
  ];
}
