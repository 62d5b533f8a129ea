import type { CustomSeriesOption } from 'echarts';
import type { CurveReading } from './chart-data';
import type { ChartPalette } from './chart-palette';
import { logTicks, type LogAxes } from './log-axes';

type RenderItem = NonNullable<CustomSeriesOption['renderItem']>;

/** Half a diamond, px. */
const DIAMOND = 5.5;
const CAP = 2.5;

/** Rules at 1, 2 and 5 of each decade, whole decades stronger, under everything else. */
export function gridSeries(axes: LogAxes, palette: ChartPalette): CustomSeriesOption {
  const render: RenderItem = (params, api) => {
    const box = params.coordSys as unknown as { x: number; y: number; width: number; height: number };
    const across = logTicks(axes.x).map((tick) => {
      const x = Math.round(api.coord([tick.position, axes.y.min])[0] ?? 0);
      return rule(x, box.y, x, box.y + box.height, tick.isDecade, palette);
    });
    const down = logTicks(axes.y).map((tick) => {
      const y = Math.round(api.coord([axes.x.min, tick.position])[1] ?? 0);
      return rule(box.x, y, box.x + box.width, y, tick.isDecade, palette);
    });
    return { type: 'group', children: [...across, ...down] };
  };
  return {
    id: 'grid',
    type: 'custom',
    xAxisIndex: 0,
    yAxisIndex: 0,
    silent: true,
    z: 0,
    data: [[axes.x.min, axes.y.min]],
    renderItem: render,
  };
}

function rule(x1: number, y1: number, x2: number, y2: number, strong: boolean, palette: ChartPalette) {
  return {
    type: 'line' as const,
    shape: { x1, y1, x2, y2 },
    style: { stroke: strong ? palette.ruleStrong : palette.rule, lineWidth: 1 },
  };
}

/** Readings as ink diamonds with ± one standard error; left out ones hollow. */
export function readingSeries(
  readings: readonly CurveReading[],
  palette: ChartPalette,
  focused: number | null,
): CustomSeriesOption {
  const render: RenderItem = (params, api) => {
    const index = params.dataIndex;
    const reading = readings[index];
    if (!reading) return null;
    const spread = Math.log10(Math.exp(reading.relativeError));
    const [x = 0, y = 0] = api.coord([Number(api.value(0)), Number(api.value(1))]);
    const top = api.coord([Number(api.value(0)), Number(api.value(1)) + spread])[1] ?? y;
    const base = api.coord([Number(api.value(0)), Number(api.value(1)) - spread])[1] ?? y;
    const color = reading.excluded ? palette.muted : palette.ink;
    const ring = {
      type: 'circle' as const,
      shape: { cx: x, cy: y, r: 11 },
      style: { stroke: palette.copper, fill: 'none', lineWidth: 1.5 },
    };
    return {
      type: 'group',
      children: [
        ...(index === focused ? [ring] : []),
        ...(reading.relativeError > 0 ? [whisker(x, top, base, color)] : []),
        {
          type: 'polygon' as const,
          shape: { points: diamond(x, y) },
          style: { fill: reading.excluded ? palette.paper : color, stroke: color, lineWidth: 1.3 },
        },
      ],
    };
  };
  return {
    id: 'readings',
    name: 'Readings',
    type: 'custom',
    xAxisIndex: 0,
    yAxisIndex: 0,
    z: 5,
    data: readings.map((reading) => [Math.log10(reading.spacing), Math.log10(reading.apparentResistivity)]),
    renderItem: render,
  };
}

function diamond(x: number, y: number): [number, number][] {
  return [
    [x, y - DIAMOND],
    [x + DIAMOND, y],
    [x, y + DIAMOND],
    [x - DIAMOND, y],
  ];
}

function whisker(x: number, top: number, base: number, color: string) {
  const line = (x1: number, y1: number, x2: number, y2: number) => ({
    type: 'line' as const,
    shape: { x1, y1, x2, y2 },
    style: { stroke: color, lineWidth: 1.2 },
  });
  return {
    type: 'group' as const,
    children: [line(x, top, x, base), line(x - CAP, top, x + CAP, top), line(x - CAP, base, x + CAP, base)],
  };
}
