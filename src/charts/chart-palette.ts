import { useIsDark } from '../ui/theme';

export interface ChartPalette {
  paper: string;
  sheet: string;
  ink: string;
  muted: string;
  rule: string;
  ruleStrong: string;
  copper: string;
  water: string;
  waterTint: string;
  rust: string;
  /** Hues of runs; see run-style.ts. */
  runs: readonly string[];
}

/** The tokens of styles.css as plain values, so that a saved drawing carries its own colours. */
const LIGHT: ChartPalette = {
  paper: '#f7f5f0',
  sheet: '#fffdf8',
  ink: '#1d2a33',
  muted: '#56626b',
  rule: '#e4e0d6',
  ruleStrong: '#c9c3b5',
  copper: '#a8571f',
  water: '#0d6e75',
  waterTint: '#dfece9',
  rust: '#9c2f1e',
  runs: ['#0d6e75', '#a8571f', '#5b4a9c', '#56731b', '#9b3468', '#2f5f9e'],
};

const DARK: ChartPalette = {
  paper: '#141a1e',
  sheet: '#1c242a',
  ink: '#ebe6db',
  muted: '#a0abb1',
  rule: '#262f36',
  ruleStrong: '#46535c',
  copper: '#e39a63',
  water: '#63c0c2',
  waterTint: '#17343a',
  rust: '#f0907c',
  runs: ['#63c0c2', '#e39a63', '#b3a4ee', '#a9c561', '#ea90bb', '#86b3ec'],
};

export function chartPalette(isDark: boolean): ChartPalette {
  return isDark ? DARK : LIGHT;
}

export function useChartPalette(): ChartPalette {
  return chartPalette(useIsDark());
}

export const SANS = "'IBM Plex Sans', system-ui, sans-serif";
export const MONO = "'IBM Plex Mono', 'IBM Plex Sans', ui-monospace, monospace";

/** Keeps words readable where a rule passes behind them. */
export function haloOf(palette: ChartPalette) {
  return { stroke: palette.paper, strokeWidth: 4, strokeLinejoin: 'round', paintOrder: 'stroke' } as const;
}
