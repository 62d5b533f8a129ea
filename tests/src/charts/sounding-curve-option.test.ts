import * as echarts from 'echarts/core';
import { CustomChart, LineChart } from 'echarts/charts';
import { GridComponent, TooltipComponent } from 'echarts/components';
import { SVGRenderer } from 'echarts/renderers';
import { describe, expect, test } from 'vitest';
import type { CurveLine, CurveReading } from '../../../src/charts/chart-data';
import { chartPalette } from '../../../src/charts/chart-palette';
import { curveBranches } from '../../../src/charts/curve-branches';
import { curveLayout } from '../../../src/charts/curve-layout';
import { curveTable } from '../../../src/charts/curve-table';
import { readingFacts, readingSentence } from '../../../src/charts/reading-facts';
import { residualPoints } from '../../../src/charts/residual-strip';
import {
  curveSize,
  residualLine,
  soundingAxes,
  soundingCurveOption,
  type SoundingCurveInput,
} from '../../../src/charts/sounding-curve-option';

echarts.use([LineChart, CustomChart, GridComponent, TooltipComponent, SVGRenderer]);

const palette = chartPalette(false);
const readings: CurveReading[] = [1.5, 6.8, 40, 300].map((spacing, i) => ({
  id: `r${i}`,
  spacing,
  label: `AB/2 ${spacing} m`,
  apparentResistivity: [140, 78, 75, 13][i]!,
  relativeError: 0.03,
  excluded: i === 1,
  reason: i === 1 ? 'wet cable' : undefined,
}));
const lineOf = (letter: string, residuals: (number | null)[], scale = 1): CurveLine => ({
  id: letter,
  kind: 'run',
  letter,
  name: '4 beds, fitted',
  points: readings.map(({ spacing, apparentResistivity }) => ({
    spacing,
    apparentResistivity: apparentResistivity * scale,
  })),
  predicted: readings.map((reading) => reading.apparentResistivity * scale),
  residuals,
});
const lines = [lineOf('A', [0.4, null, -2.4, 7]), lineOf('B', [1, null, 1, 1], 1.05)];
const input: SoundingCurveInput = {
  readings,
  lines,
  chosenLine: 'A',
  focusedReading: null,
  spacingName: 'AB/2, m',
  width: 800,
  height: 480,
  palette,
};
const listOf = <Item>(value: Item | Item[] | undefined): Item[] =>
  Array.isArray(value) ? value : value ? [value] : [];

function drawn(changes: Partial<SoundingCurveInput> = {}): string {
  const chart = echarts.init(null, null, { renderer: 'svg', ssr: true, width: 800, height: 480 });
  chart.setOption(soundingCurveOption({ ...input, ...changes }));
  const svg = chart.renderToSVGString();
  chart.dispose();
  return svg;
}
const count = (svg: string, text: string) => svg.split(text).length - 1;

describe('axes', () => {
  test('decades are square in the drawing itself', () => {
    const option = soundingCurveOption(input);
    const { plot } = curveLayout(800, 480, { hasStrip: true });
    const [x] = listOf(option.xAxis) as { min: number; max: number }[];
    const [y] = listOf(option.yAxis) as { min: number; max: number }[];
    expect(plot.width / (x!.max - x!.min)).toBeCloseTo(plot.height / (y!.max - y!.min), 6);
  });

  test('curve and strip share the x axis', () => {
    const [first, second] = listOf(soundingCurveOption(input).xAxis) as { min: number; max: number }[];
    expect([second!.min, second!.max]).toEqual([first!.min, first!.max]);
    const { plot, strip } = curveLayout(800, 480, { hasStrip: true });
    expect([strip!.left, strip!.width]).toEqual([plot.left, plot.width]);
    expect(strip!.top + strip!.height).toBeLessThan(480);
  });

  test('whiskers and curves lie inside the range, a ghost does not stretch it', () => {
    const layout = curveLayout(800, 480, { hasStrip: true });
    const plain = soundingAxes({ readings, lines }, layout);
    const ghost: CurveLine = {
      ...lines[0]!,
      id: 'g',
      kind: 'ghost',
      points: [{ spacing: 5, apparentResistivity: 1e6 }],
    };
    expect(soundingAxes({ readings, lines: [...lines, ghost] }, layout)).toEqual(plain);
    const far: CurveLine = { ...ghost, kind: 'hand' };
    expect(soundingAxes({ readings, lines: [...lines, far] }, layout).y.max).toBeGreaterThan(6);
  });

  test('a narrow drawing is lower, a low one narrower', () => {
    const narrow = curveSize({ readings, lines }, 360, 600);
    expect(narrow.width).toBe(360);
    expect(narrow.height).toBeLessThan(450);
    expect(narrow.height).toBeGreaterThanOrEqual(260);
    const low = curveSize({ readings, lines }, 1600, 480);
    expect(low.height).toBe(480);
    const axes = soundingAxes({ readings, lines }, curveLayout(low.width, low.height, { hasStrip: true }));
    expect(axes.x.max - axes.x.min).toBeLessThan(Math.log10(300 / 1.5) + 0.81);
  });

  test('drawings that share their axes have the same', () => {
    const far = { ...lines[1]!, points: [{ spacing: 4000, apparentResistivity: 5 }] };
    const shared = { readings, lines: [lines[0]!, far] };
    const rangeOf = (of: Partial<SoundingCurveInput>) => {
      const [x] = listOf(soundingCurveOption({ ...input, ...of }).xAxis) as { max: number }[];
      return x!.max;
    };
    expect(rangeOf({ lines: [lines[0]!] })).toBeLessThan(Math.log10(4000));
    expect(rangeOf({ lines: [lines[0]!], axesOf: shared })).toBe(rangeOf({ lines: [far], axesOf: shared }));
  });
});

describe('drawing', () => {
  test('letters, dashes and hues of both runs', () => {
    const svg = drawn();
    expect(svg).toMatch(/>A<\/text>/);
    expect(svg).toMatch(/>B<\/text>/);
    expect(svg).toContain('stroke-dasharray="7,4"');
    expect(svg).toContain(palette.runs[0]!);
    expect(svg).toContain(palette.runs[1]!);
  });

  test('a curve has a gap before a branch that it is not drawn through to', () => {
    const points = lines[0]!.points.map((point, i) => ({ ...point, startsBranch: i === 2 }));
    const series = listOf(soundingCurveOption({ ...input, lines: [{ ...lines[0]!, points }] }).series);
    const { data } = series.find((one) => one.id === 'curve-A') as { data: (number | null)[][] };
    expect(data.map(([, y]) => y === null)).toEqual([false, false, true, false, false]);
  });

  test('the axis is numbered 1, 2, 5 with its unit', () => {
    const svg = drawn();
    for (const label of ['2', '5', '10', '100']) expect(svg).toContain(`>${label}</text>`);
    expect(svg).toContain('>AB/2, m</text>');
    expect(svg).toContain('>+2σ</text>');
  });

  test('a left out reading is hollow, and loses its residual', () => {
    const whole = drawn({ readings: readings.map((reading) => ({ ...reading, excluded: false })) });
    expect(count(drawn(), palette.muted)).toBeGreaterThan(count(whole, palette.muted));
    expect(residualPoints(readings, lines[1]!.residuals!).map((point) => point.reading)).toEqual([0, 2, 3]);
  });

  test('residuals beyond two standard errors are rust', () => {
    expect(drawn()).toContain(palette.rust);
    expect(drawn({ chosenLine: 'B' })).not.toContain(palette.rust);
  });

  test('the reading walked to is ringed', () => {
    expect(count(drawn({ focusedReading: 1 }), palette.copper)).toBeGreaterThan(
      count(drawn(), palette.copper),
    );
  });

  test('without residuals there is no strip', () => {
    const bare = lines.map((line) => ({ ...line, residuals: undefined }));
    expect(listOf(soundingCurveOption({ ...input, lines: bare }).xAxis)).toHaveLength(1);
    expect(drawn({ lines: bare })).not.toContain('+2σ');
  });

  test('no readings and no curves still draw', () =>
    expect(drawn({ readings: [], lines: [] })).toContain('<svg'));
});

test('the strip follows the chosen line, else the first with residuals', () => {
  expect(residualLine(lines, 'B')?.id).toBe('B');
  expect(residualLine(lines, 'gone')?.id).toBe('A');
  expect(residualLine([], 'A')).toBeNull();
});

describe('words', () => {
  test('a reading with its prediction and residual', () => {
    const facts = readingFacts(readings[2]!, 2, lines[0]!);
    expect(facts.map((fact) => fact.value)).toEqual([
      'AB/2 40 m',
      '75.0\u00a0Ω·m',
      '3.0\u00a0%',
      '75.0\u00a0Ω·m',
      '\u22122.40\u00a0σ',
    ]);
    expect(readingSentence(facts)).toContain('residual, run A \u22122.40\u00a0standard errors');
  });

  test('a left out reading says why, with the residual it would have', () => {
    const facts = readingFacts(readings[1]!, 1, lines[0]!);
    expect(facts.at(-1)).toEqual({ label: 'Left out', value: 'wet cable' });
    const told = readingFacts(readings[1]!, 1, lineOf('B', [1, 2.5, 1, 1]));
    expect(told.slice(-2).map((fact) => fact.value)).toEqual(['+2.50\u00a0σ', 'wet cable']);
  });

  test('an unknown error is not shown as 0 %', () => {
    const labels = readingFacts({ ...readings[0]!, relativeError: 0 }, 0, null).map((fact) => fact.label);
    expect(labels).not.toContain('Standard error');
  });

  test('the tip escapes what people wrote', () => {
    const evil = readings.map((reading) => ({ ...reading, excluded: true, reason: '<img src=x>' }));
    const option = soundingCurveOption({ ...input, readings: evil });
    const { formatter } = option.tooltip as { formatter: (item: object) => string };
    const html = formatter({ seriesId: 'readings', dataIndex: 1 });
    expect(html).toContain('&#60;img');
    expect(html).not.toContain('<img');
  });

  test('a residual in the strip is told with its own reading', () => {
    const { formatter } = soundingCurveOption(input).tooltip as { formatter: (item: object) => string };
    expect(formatter({ seriesId: 'residuals', dataIndex: 1 })).toContain('AB/2 40 m');
  });
});

test('the table has every reading and each run in order of letters', () => {
  const { columns, rows } = curveTable(readings, lines.toReversed(), 'AB/2, m');
  expect(columns.map((column) => column.label).slice(4)).toEqual([
    'Predicted, run A',
    'Residual, run A',
    'Predicted, run B',
    'Residual, run B',
  ]);
  expect(rows[1]!.slice(0, 4)).toEqual([6.8, 78, 0.03, 'left out: wet cable']);
  expect(columns[0]?.format?.(6.8)).toBe('6.8');
  expect(curveTable(readings, lines, 'AB/2 of equal depth, m').columns[0]?.format?.(6.8)).toBe('6.80');
  expect(rows[3]!.slice(4, 6)).toEqual([13, 7]);
});

/** The texts of a drawing that stand above its plot. */
const aboveThePlot = (svg: string): string =>
  (svg.match(/<text[^>]* x="[\d.]+" y="[\d.]+"[^>]*>[^<]*<\/text>/g) ?? [])
    .filter((text) => Number(/ y="([\d.]+)"/.exec(text)?.[1]) < 30)
    .join('');

describe('branches of MN', () => {
  const halfMNs = [0.5, 0.5, 0.5, 10];
  const branched = readings.map((reading, i) => ({ ...reading, halfMN: halfMNs[i] }));

  test('hold the kept readings of each MN in order of spacing', () => {
    const branches = curveBranches(branched.toReversed());
    expect(branches.map(({ halfMN, readings: own }) => [halfMN, own.map(({ id }) => id)])).toEqual([
      [0.5, ['r0', 'r2']],
      [10, ['r3']],
    ]);
  });

  test('have their MN above the plot where there is more than one', () => {
    const numbers = (changes: CurveReading[]) =>
      ['MN/2, m', '>0.5<', '>10<'].filter((text) =>
        aboveThePlot(drawn({ readings: changes })).includes(text),
      );
    expect(numbers(branched)).toEqual(['MN/2, m', '>0.5<', '>10<']);
    expect(numbers(branched.map((reading) => ({ ...reading, halfMN: 0.5 })))).toEqual([]);
    const top = (hasBranches: boolean) => curveLayout(800, 480, { hasStrip: true, hasBranches }).plot.top;
    expect(top(true)).toBeGreaterThan(top(false));
  });

  test('leave out a number that would run into the one before it', () => {
    const close = branched.map((reading, i) => ({
      ...reading,
      halfMN: i < 2 ? 0.25 : i + 0.25,
      spacing: 10 + i / 10,
    }));
    const above = aboveThePlot(drawn({ readings: close }));
    expect(above).toContain('>0.25<');
    expect(above).not.toContain('>2.25<');
  });

  test('stand in the table and in the words of a reading', () => {
    const table = curveTable(branched, [], 'AB/2, m');
    expect(table.columns.map((column) => column.label).slice(0, 3)).toEqual(['AB/2', 'MN/2', 'Measured']);
    expect(table.rows.map((row) => row[1])).toEqual(halfMNs);
    expect(curveTable(readings, [], 'AB/2, m').columns.map((column) => column.label)).not.toContain('MN/2');
    expect(readingFacts(branched[3]!, 3, null)[0]?.value).toBe('AB/2 300 m, MN/2 10\u00a0m');
  });
});
