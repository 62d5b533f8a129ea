import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { chartPalette } from '../../../src/charts/chart-palette';
import { contrastRatio } from '../../../src/charts/oklab';

const css = readFileSync(new URL('../../../src/styles.css', import.meta.url), 'utf8');

function tokensOf(selector: string): Record<string, string> {
  const start = css.indexOf(`${selector} {`);
  const block = css.slice(start, css.indexOf('}', start));
  return Object.fromEntries(
    [...block.matchAll(/--([\w-]+): (#[0-9a-f]{6});/g)].map((match) => [match[1]!, match[2]!]),
  );
}

const themes = {
  light: tokensOf(':root'),
  'dark by the system': tokensOf(":root:not([data-theme='light'])"),
  'dark by choice': tokensOf(":root[data-theme='dark']"),
};

describe.each(Object.entries(themes))('%s tokens', (_, token) => {
  test.each(['ink', 'muted', 'copper', 'water', 'rust'])('%s reads on every ground', (name) => {
    for (const ground of ['paper', 'sheet', 'sunken'])
      expect(contrastRatio(token[name]!, token[ground]!)).toBeGreaterThanOrEqual(4.5);
  });

  test.each(['copper', 'water', 'rust'])('words on a %s field read', (name) => {
    expect(contrastRatio(token[`on-${name}`]!, token[name]!)).toBeGreaterThanOrEqual(4.5);
    expect(contrastRatio(token['ink']!, token[`${name}-tint`]!)).toBeGreaterThanOrEqual(4.5);
  });

  test('edges of controls and the focus ring stand out', () => {
    for (const name of ['edge', 'water'])
      for (const ground of ['paper', 'sheet'])
        expect(contrastRatio(token[name]!, token[ground]!)).toBeGreaterThanOrEqual(3);
  });
});

test('both ways into the dark theme give the same colours', () => {
  expect(themes['dark by the system']).toEqual(themes['dark by choice']);
});

test.each([
  [false, themes.light],
  [true, themes['dark by choice']],
])('drawings use the colours of the page (dark: %s)', (isDark, token) => {
  const palette = chartPalette(isDark);
  for (const name of ['paper', 'sheet', 'ink', 'muted', 'copper', 'water', 'rust'] as const)
    expect(palette[name]).toBe(token[name]);
});

test.each([false, true])('hues of runs stand out on paper (dark: %s)', (isDark) => {
  const palette = chartPalette(isDark);
  for (const hue of palette.runs) expect(contrastRatio(hue, palette.paper)).toBeGreaterThanOrEqual(4.5);
});

test('paper has every colour of the light theme, whatever theme is shown', () => {
  const printed = tokensOf(':root:not([data-theme])');
  const onWhite = ['paper', 'sheet', 'sunken', 'ink', 'muted', 'rule'];
  const light = Object.entries(themes.light).filter(([name]) => !onWhite.includes(name));
  expect(printed).toMatchObject(Object.fromEntries(light));
  for (const name of onWhite) expect(printed).toHaveProperty(name);
});
