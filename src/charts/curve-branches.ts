import type { CustomSeriesOption } from 'echarts';
import { formatGivenLength, withUnit } from '../ui/format';
import type { CurveReading } from './chart-data';
import { MONO, SANS, type ChartPalette } from './chart-palette';
import { textWidth } from './fit-text';

/** Kept readings of one MN, in order of spacing. */
export interface CurveBranch {
  /** m */
  halfMN: number;
  readings: readonly CurveReading[];
}

/** As written on the sheet: "MN/2 0.5 m". */
export const branchName = (halfMN: number): string => withUnit(`MN/2 ${formatGivenLength(halfMN)}`, 'm');

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
type Api = Parameters<RenderItem>[1];
type Point = [number, number];

/** Room above the plot for the brackets of the branches and their MN, px. */
export const BRANCH_ROOM = 20;
/** Brackets and numbers above the upper edge of the plot, px; brackets by turns, for neighbours share a spacing. */
const BRACKET_RISES = [5, 8] as const;
const NUMBER_RISE = 17;
const NUMBER_GAP = 6;

/**
 * Joins the readings of each MN by a thin line of its own, and tells over which spacings it reaches by a bracket with its MN
 * above the plot.
 */
export function branchSeries(
  readings: readonly CurveReading[],
  palette: ChartPalette,
): CustomSeriesOption | null {
  const branches = curveBranches(readings);
  if (branches.length === 0) return null;
  const render: RenderItem = (params, api) => {
    const { dataIndex } = params;
    const branch = branches[dataIndex];
    if (!branch) return null;
    const box = params.coordSys as unknown as { x: number; y: number };
    const points = branch.readings.map((reading) => pointOf(reading, api));
    const number = branchNumbers(branches, api)[dataIndex];
    const rise = BRACKET_RISES[dataIndex % 2] ?? BRACKET_RISES[0];
    const name = words('MN/2, m', box.x - 8, box.y - NUMBER_RISE, 'right', SANS, palette);
    return {
      type: 'group',
      children: [
        polyline(points, palette, 0.7),
        polyline(bracket(points, box.y, rise), palette, 1),
        ...(number ? [words(number.text, number.x, box.y - NUMBER_RISE, 'center', MONO, palette)] : []),
        ...(dataIndex === 0 ? [name] : []),
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

function pointOf(reading: CurveReading, api: Api): Point {
  const [x = 0, y = 0] = api.coord([Math.log10(reading.spacing), Math.log10(reading.apparentResistivity)]);
  return [x, y];
}

/** The MN of each branch over the middle of its bracket; null where it would run into the one before it. */
function branchNumbers(branches: readonly CurveBranch[], api: Api): ({ text: string; x: number } | null)[] {
  let end = Number.NEGATIVE_INFINITY;
  return branches.map(({ halfMN, readings }) => {
    const ends = [readings[0], readings.at(-1)].flatMap((reading) =>
      reading ? pointOf(reading, api)[0] : [],
    );
    const x = ends.reduce((sum, one) => sum + one / ends.length, 0);
    const text = formatGivenLength(halfMN);
    const half = textWidth(text, 'mono') / 2;
    if (x - half < end + NUMBER_GAP) return null;
    end = x + half;
    return { text, x };
  });
}

function bracket(points: readonly Point[], top: number, rise: number): Point[] {
  const [from, to] = [points[0]?.[0] ?? 0, points.at(-1)?.[0] ?? 0];
  return [
    [from, top - rise + 3],
    [from, top - rise],
    [to, top - rise],
    [to, top - rise + 3],
  ];
}

const polyline = (points: Point[], palette: ChartPalette, opacity: number) => ({
  type: 'polyline' as const,
  shape: { points },
  style: { stroke: palette.muted, fill: 'none', lineWidth: 1, opacity },
});

function words(
  text: string,
  x: number,
  y: number,
  align: 'center' | 'right',
  fontFamily: string,
  palette: ChartPalette,
) {
  const style = { text, x, y, align, verticalAlign: 'middle' as const, fill: palette.muted, fontSize: 12 };
  return { type: 'text' as const, style: { ...style, fontFamily } };
}
