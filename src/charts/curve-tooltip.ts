import type { EChartsOption } from 'echarts';
import type { CurveLine, CurveReading } from './chart-data';
import { MONO, SANS, type ChartPalette } from './chart-palette';
import { readingFacts } from './reading-facts';
import { residualPoints } from './residual-strip';

/** Spacing, value, error and residual of the reading under the pointer, in the curve or in the strip. */
export function curveTooltip(
  readings: readonly CurveReading[],
  shown: CurveLine | null,
  palette: ChartPalette,
): EChartsOption['tooltip'] {
  return {
    trigger: 'item',
    transitionDuration: 0,
    confine: true,
    backgroundColor: palette.sheet,
    borderColor: palette.ruleStrong,
    borderWidth: 1,
    padding: [8, 12],
    textStyle: { color: palette.ink, fontSize: 13, fontFamily: SANS },
    extraCssText: 'box-shadow:none;border-radius:3px;',
    formatter: (hovered) => {
      const item = Array.isArray(hovered) ? hovered[0] : hovered;
      if (!item) return '';
      const points = shown?.residuals ? residualPoints(readings, shown.residuals) : [];
      const index = item.seriesId === 'residuals' ? points[item.dataIndex]?.reading : item.dataIndex;
      const reading = readings[index ?? -1];
      if (reading === undefined || index === undefined) return '';
      return factsHtml(readingFacts(reading, index, shown));
    },
  };
}

function factsHtml(facts: readonly { label: string; value: string }[]): string {
  const rows = facts.map(
    ({ label, value }) =>
      `<tr><td style="padding-right:14px">${escapeHtml(label)}</td><td style="text-align:right;font-family:${MONO.replaceAll("'", '')}">${escapeHtml(value)}</td></tr>`,
  );
  return `<table>${rows.join('')}</table>`;
}

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}
