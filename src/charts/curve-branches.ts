import type { CustomSeriesOption } from 'echarts';
import { withUnit } from '../ui/format';
import type { CurveReading } from './chart-data';
import { SANS, type ChartPalette } from './chart-palette';

/** Kept readings of one MN, in order of spacing. */
export interface CurveBranch {
  /** m */
  halfMN: number;
  readings: readonly CurveReading[];
}

/** "MN/2 0.5 m" */
export const branchName = (halfMN: number): string => withUnit(`MN/2 ${Number(halfMN.toPrecision(3))}`, 'm');

/** The branches of a curve by growing MN; none where all readings are of one. */
export function curveBranches(readings: readonly CurveReading[]): CurveBranch[] {
  const branches = new Map<number, CurveReading[]>();
  for (const reading of readings)
    if (reading.halfMN !== undefined && !reading.excluded)
      branches.set(reading.halfMN, [...(branches.get(reading.halfMN) ?? []), reading]);
  if (branches.size < 2) return [];
  return [...branches]
    .map(([halfMN, own]) => ({ halfMN, readings: own.toSorted((a, b) => a.spacing - b.spacing) }))
    .toSorted((a, b) => a.halfMN - b.halfMN);
}

type RenderItem = NonNullable<CustomSeriesOption['renderItem']>;
type Point = [number, number];

/** From a reading to the words of its branch, px. */
const LABEL_GAP = 20;

/** Joins the readings of each MN by a thin line of its own and names it, by turns above and below. */
export function branchSeries(
  readings: readonly CurveReading[],
  palette: ChartPalette,
): CustomSeriesOption | null {
  const branches = curveBranches(readings);
  if (branches.length === 0) return null;
  const render: RenderItem = (params, api) => {
    const branch = branches[params.dataIndex];
    if (!branch) return null;
    const points = branch.readings.map((reading): Point => {
      const [x = 0, y = 0] = api.coord([
        Math.log10(reading.spacing),
        Math.log10(reading.apparentResistivity),
      ]);
      return [x, y];
    });
    const [x, y] = points[Math.floor(points.length / 2)] ?? [0, 0];
    const side = params.dataIndex % 2 === 0 ? 1 : -1;
    return {
      type: 'group',
      children: [
        {
          type: 'polyline' as const,
          shape: { points },
          style: { stroke: palette.muted, fill: 'none', lineWidth: 1, opacity: 0.7 },
        },
        {
          type: 'text' as const,
          style: {
            text: branchName(branch.halfMN),
            x,
            y: y + side * LABEL_GAP,
            align: 'center' as const,
            verticalAlign: 'middle' as const,
            fill: palette.muted,
            stroke: palette.paper,
            lineWidth: 3,
            fontSize: 12,
            fontFamily: SANS,
          },
        },
      ],
    };
  };
  return {
    id: 'branches',
    type: 'custom',
    xAxisIndex: 0,
    yAxisIndex: 0,
    silent: true,
    z: 1,
    data: branches.map(({ readings: [first] }) => [
      Math.log10(first?.spacing ?? 1),
      Math.log10(first?.apparentResistivity ?? 1),
    ]),
    renderItem: render,
  };
}
