import { useLayoutEffect, useMemo, useRef, useState } from 'react';
import { ChartFrame } from './chart-frame';
import type { CurveLine, CurveReading } from './chart-data';
import { useChartPalette } from './chart-palette';
import { curveTable } from './curve-table';
import { echarts, ReactECharts } from './echarts-svg';
import { readingFacts, readingSentence } from './reading-facts';
import { curveSize, residualLine, soundingCurveOption, type CurveContent } from './sounding-curve-option';
import { useBoxSize } from './use-box-size';

export interface SoundingCurveProps {
  readings: readonly CurveReading[];
  lines: readonly CurveLine[];
  /** The line drawn strongest, whose residuals stand below. */
  chosenLine?: string | null;
  /** What the axes hold, where several drawings share them. */
  axesOf?: CurveContent;
  /** Name of the x axis with its unit, as "AB/2, m". */
  spacingName: string;
  title?: string;
  note?: string;
  /** Name of the sounding, for file names. */
  subject?: string;
  /** Greatest height of the drawing, px; a narrow one is lower. Three quarters of the window unless given. */
  maxHeight?: number;
  className?: string;
  /** The reading that is walked to or pressed, by its index. */
  onFocusReading?: (index: number | null) => void;
}

export function SoundingCurve(props: SoundingCurveProps) {
  const {
    readings,
    lines,
    chosenLine = null,
    spacingName,
    title = 'Apparent resistivity',
    className,
  } = props;
  const { maxHeight = tallest(), axesOf, onFocusReading } = props;
  const palette = useChartPalette();
  const { ref, size } = useBoxSize<HTMLDivElement>();
  const [focused, setFocused] = useState<number | null>(null);
  const focusedReading = focused !== null && focused < readings.length ? focused : null;
  const focusOn = (index: number | null) => {
    setFocused(index);
    onFocusReading?.(index);
  };
  const { width, height } = useMemo(
    () => curveSize(axesOf ?? { readings, lines }, size.width, maxHeight),
    [axesOf, readings, lines, size.width, maxHeight],
  );
  const option = useMemo(
    () =>
      soundingCurveOption({
        readings,
        lines,
        axesOf,
        chosenLine,
        focusedReading,
        spacingName,
        width,
        height,
        palette,
      }),
    [readings, lines, axesOf, chosenLine, focusedReading, spacingName, width, height, palette],
  );
  const chart = useRef<InstanceType<typeof ReactECharts>>(null);
  // The component lets the first change of size pass, so the drawing is told by itself, before its new box is painted.
  useLayoutEffect(() => chart.current?.getEchartsInstance()?.resize({ width, height }), [width, height]);
  const table = useMemo(() => curveTable(readings, lines, spacingName), [readings, lines, spacingName]);
  const shown = residualLine(lines, chosenLine);
  return (
    <ChartFrame
      title={title}
      note={props.note ?? 'Ω·m'}
      table={table}
      {...(props.subject ? { subject: props.subject } : {})}
      {...(className ? { className } : {})}
    >
      <ReadingWalker readings={readings} shown={shown} focused={focusedReading} onFocus={focusOn} />
      <div
        ref={ref}
        aria-hidden
        className="relative min-w-0 max-w-[80rem] rounded peer-focus-visible:outline-2 peer-focus-visible:outline-water"
        style={{ height }}
      >
        {size.width > 0 ? (
          <ReactECharts
            ref={chart}
            echarts={echarts}
            option={option}
            notMerge
            opts={{ renderer: 'svg' }}
            onEvents={{
              click: (event: { seriesId?: string; dataIndex?: number }) => {
                if (event.seriesId === 'readings') focusOn(event.dataIndex ?? null);
              },
            }}
            style={{ position: 'absolute', inset: 0, height, width }}
          />
        ) : null}
      </div>
      <CurveReadout reading={readings[focusedReading ?? -1]} index={focusedReading} shown={shown} />
    </ChartFrame>
  );
}

const tallest = () => Math.max(420, Math.round(window.innerHeight * 0.75));

interface CurveReadoutProps {
  reading: CurveReading | undefined;
  index: number | null;
  shown: CurveLine | null;
}

/** One line under the drawing: the reading that is walked to, or what the strip shows. */
function CurveReadout({ reading, index, shown }: CurveReadoutProps) {
  if (reading !== undefined && index !== null)
    return (
      <p aria-hidden className="figure pt-1 text-sm">
        {readingFacts(reading, index, shown)
          .map(({ label, value }, place) => (place === 0 ? value : `${label} ${value}`))
          .join(' \u00b7 ')}
      </p>
    );
  if (!shown) return null;
  return (
    <p className="pt-1 text-sm text-muted">
      {shown.letter ? `Run ${shown.letter}: m` : 'M'}isfit of each reading in its own standard error; above 0
      the model reads higher.
    </p>
  );
}

interface ReadingWalkerProps {
  readings: readonly CurveReading[];
  shown: CurveLine | null;
  focused: number | null;
  onFocus: (index: number | null) => void;
}

/** A slider out of sight: arrow keys walk through the readings and each is said in words. */
function ReadingWalker({ readings, shown, focused, onFocus }: ReadingWalkerProps) {
  const index = focused ?? 0;
  const reading = readings[index];
  if (!reading) return null;
  return (
    <input
      type="range"
      min={0}
      max={readings.length - 1}
      step={1}
      value={index}
      aria-label="Readings of the curve"
      aria-valuetext={readingSentence(readingFacts(reading, index, shown))}
      onChange={(event) => onFocus(Number(event.target.value))}
      onFocus={() => onFocus(index)}
      onBlur={() => onFocus(null)}
      className="peer sr-only"
    />
  );
}
