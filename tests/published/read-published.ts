import { readFileSync } from 'node:fs';
import type { Reading, Spread } from '../../inversion';

/** Rows of a published CSV: its numbers by column heading. */
export function publishedRows(name: string): Record<string, number>[] {
  const text = readFileSync(new URL(name, import.meta.url), 'utf8');
  const [head, ...lines] = text.trim().split(/\r?\n/);
  const names = head!.split(',');
  return lines.map((line) => Object.fromEntries(line.split(',').map((cell, i) => [names[i]!, Number(cell)])));
}

/** A published CSV as readings with one relative error: Wenner by its column a, else Schlumberger with MN not recorded. */
export function publishedReadings(name: string, relativeError: number): Reading[] {
  return publishedRows(name).map((row) => {
    const a = row['a (m)'];
    const spread: Spread =
      a === undefined
        ? { type: 'schlumberger', halfAB: row['AB/2 (m)']!, halfMN: null }
        : { type: 'wenner', spacing: a };
    const fromResistance = 2 * Math.PI * (a ?? 0) * (row['R (ohm)'] ?? 0);
    return { spread, apparentResistivity: row['rhoa (ohm m)'] ?? fromResistance, relativeError };
  });
}
