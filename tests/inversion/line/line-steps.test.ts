import { describe, expect, it } from 'vitest';
import { lateralTie, logEarthOf, tiedValues } from '../../../inversion/line/lateral-ties';
import { lineProblem, loneProblem, placesOf } from '../../../inversion/line/line-layout';
import { evaluateLine, lineariseLine, type LineState } from '../../../inversion/line/line-problem';
import { repairLine } from '../../../inversion/line/line-repair';
import { bestPath, lineStarts, type Candidate } from '../../../inversion/line/line-starts';
import { minimiseLine } from '../../../inversion/line/minimise-line';
import type { LineSettings } from '../../../inversion';
import { alongLine, everyMetres, inventedLine } from './invented-line';

const GROUND = { resistivity: [100, 20, 300], thickness: [4, 12] };
const logs = [...GROUND.resistivity, ...GROUND.thickness].map(Math.log);

function problemOf(count: number, more: Partial<LineSettings> = {}) {
  const settings = alongLine(3, more);
  const places = placesOf(
    inventedLine(everyMetres(100, count), () => GROUND),
    settings,
  );
  const problem = lineProblem(places, 3, settings);
  const at = (values: readonly number[]) => problem.nodes.map(({ restrict }) => restrict(values));
  return { problem, at };
}

describe('lateral ties', () => {
  it('let the variance grow with the distance, so that a place between changes nothing', () => {
    const scales = { resistivity: 0.2, depth: 0.4 };
    const variance = (distance: number) => lateralTie(distance, scales).perDepth ** -2;
    expect(lateralTie(100, scales)).toEqual({ perResistivity: 5, perDepth: 2.5 });
    expect(variance(30) + variance(70)).toBeCloseTo(variance(100), 12);
    expect(variance(0)).toBe(variance(1));
  });

  it('tie depths, not thicknesses, and find the way back', () => {
    const values = tiedValues(logs, 3);
    expect(Array.from(values, Math.exp).map((value) => Number(value.toFixed(9)))).toEqual([
      100, 20, 300, 4, 16,
    ]);
    logEarthOf(values, 3).forEach((value, j) => expect(value).toBeCloseTo(logs[j]!, 12));
  });
});

describe('a line linearised', () => {
  const boreholes = [{ x: 130, contacts: [{ boundary: 1, depth: 14, sigma: 1 }] }];
  const fixed = [{ on: 'thickness', index: 0, value: 4 }] as const;
  const { problem, at } = problemOf(3, { boreholes, fixed });
  const state = at(logs).map((values, s) => values.map((value, j) => value + 0.05 * ((s + 2 * j) % 3)));
  const line = lineariseLine(problem, state);

  it('has the slopes of its objective, half of which is Jᵀr', () => {
    expect(problem.nodes).toHaveLength(4);
    state.forEach((values, s) =>
      values.forEach((_, j) => {
        const moved = (by: number): LineState =>
          state.map((own, o) => own.map((value, k) => (o === s && k === j ? value + by : value)));
        const rise =
          evaluateLine(problem, moved(1e-5)).objective - evaluateLine(problem, moved(-1e-5)).objective;
        expect(line.gradients[s]![j]! / (rise / 4e-5)).toBeCloseTo(1, 5);
      }),
    );
  });
});

describe('the steps of a line', () => {
  it('end where no slope is left, from far away, and stay within the bounds', () => {
    const bounds = { resistivity: [25, 280], thickness: [0.5, 100] } as const;
    const { problem, at } = problemOf(8, { bounds });
    const outcome = minimiseLine(problem, at([100, 100, 100, 2, 2].map(Math.log)));
    expect(outcome.status).toMatch(/^converged/);
    outcome.state.forEach((values) => {
      expect(values[1]).toBe(Math.log(25));
      values.forEach((value, j) => expect(value).toBeGreaterThanOrEqual(problem.nodes[0]!.problem.low[j]!));
    });
    const { gradients } = lineariseLine(problem, outcome.state);
    gradients.forEach((gradient) => expect(Math.abs(gradient[0]!)).toBeLessThan(1));
  });

  it('are as many for a long line as for a short one, one difficult sounding or not', () => {
    const run = (count: number) => {
      const { problem, at } = problemOf(count);
      const start = at(logs).map((values, s) => (s === 2 ? values.map((value) => value + 1.5) : values));
      return minimiseLine(problem, start).iterations;
    };
    expect(run(60)).toBeLessThanOrEqual(run(15) + 5);
  });
});

describe('a sounding in a wrong valley', () => {
  it('is drawn out by the models of its neighbours, and a line that is right stays', () => {
    const { problem, at } = problemOf(5);
    const right = minimiseLine(problem, at(logs)).state;
    expect(repairLine(problem, right)).toBeNull();
    const wrong = right.map((values, s) => (s === 2 ? at([60, 60, 60, 1, 1].map(Math.log))[s]! : values));
    const repaired = repairLine(problem, wrong)!;
    repaired[2]!.forEach((value, j) => expect(Math.abs(value - right[2]![j]!)).toBeLessThan(0.2));
  });

  it('is not chosen where a slightly worse fit of its own agrees with the line', () => {
    const candidate = (chi2: number, logRho: number): Candidate => ({
      free: Float64Array.of(logRho),
      chi2,
      tied: Float64Array.of(logRho),
    });
    const places = [0, 100, 200].map((x) => ({ x }));
    const choices = [[candidate(10, 3)], [candidate(10, 5), candidate(12, 3.1)], [candidate(10, 3)]];
    const chosen = (depth: number) =>
      bestPath(places, choices, 1, { resistivity: depth, depth }).map(({ free }) => free[0]);
    expect(chosen(0.2)).toEqual([3, 3.1, 3]);
    expect(chosen(100)).toEqual([3, 5, 3]);
  });
});

describe('the starts of a line', () => {
  const line = inventedLine(everyMetres(100, 5), () => GROUND);

  it('are those of the neighbours where a sounding has too few readings of its own', () => {
    const poor = line.map(({ x, readings }, i) => ({
      x,
      readings: i === 2 ? readings.slice(0, 2) : readings,
    }));
    const settings = alongLine(3);
    const places = placesOf(poor, settings);
    const lone = places.map(({ x, sounding }, s) => ({
      x,
      curve: sounding!.curve,
      layered: loneProblem(places, s, 3, settings),
      fewer: undefined,
    }));
    const starts = lineStarts(lone, settings.lateral, 1, undefined, () => undefined);
    starts[2]!.forEach((value, j) => expect(Math.abs(value - logs[j]!)).toBeLessThan(0.5));
  });

  it('know the contacts of a borehole next to them, where the layers have that boundary', () => {
    const contacts = [{ boundary: 1, depth: 16, sigma: 1 }];
    const settings = alongLine(3, { boreholes: [{ x: 150, contacts }] });
    const places = placesOf(line, settings);
    const rows = (s: number, layers: number) =>
      loneProblem(places, s, layers, settings).problem.residuals - places[s]!.sounding!.readings.length;
    expect([rows(0, 3), rows(1, 3), rows(3, 3), rows(1, 2)]).toEqual([0, 1, 1, 0]);
  });
});
