import { describe, expect, it } from 'vitest';
import { placeLabels } from '../../../../src/features/surveys/plan-labels';
import { alongLine, planHeight, planLayout, roundDown } from '../../../../src/features/surveys/plan-layout';
import { progressSteps } from '../../../../src/features/surveys/progress-steps';
import { waitingQuestions } from '../../../../src/features/surveys/waiting-questions';

const box = { width: 400, height: 300, margin: 50 };

describe('the plan', () => {
  it('has one scale for both axes, y upwards, and keeps every point inside its margin', () => {
    const points = [
      { xM: 1000, yM: 2000 },
      { xM: 1300, yM: 2100 },
    ];
    const { toPage } = planLayout(points, box);
    const [a, b] = points.map(toPage);
    expect(a).toEqual({ x: 50, y: 200 });
    expect(b).toEqual({ x: 350, y: 100 });
  });

  it('shows ground around a single point', () => {
    const { toPage, scaleBar } = planLayout([{ xM: 5, yM: 5 }], box);
    expect(toPage({ xM: 5, yM: 5 })).toEqual({ x: 200, y: 150 });
    expect(scaleBar.lengthM).toBe(2);
  });

  it('is as tall as its points need to fill the width, within limits', () => {
    const corner = (xM: number, yM: number) => [
      { xM: 0, yM: 0 },
      { xM, yM },
    ];
    expect(planHeight(corner(100, 150), { width: 358, margin: 48 })).toBe(1.5 * 262 + 96);
    expect(planHeight(corner(1000, 1), { width: 358, margin: 48 })).toBe(300);
    expect(planHeight(corner(1000, 1), { width: 800, margin: 48 })).toBe(496);
    expect(planHeight(corner(1, 1000), { width: 800, margin: 48 })).toBe(620);
  });

  it('has a scale bar of a round length that is drawn to scale', () => {
    const { scaleBar, toPage } = planLayout(
      [
        { xM: 0, yM: 0 },
        { xM: 700, yM: 0 },
      ],
      box,
    );
    expect(scaleBar.lengthM).toBe(200);
    const length = toPage({ xM: 200, yM: 0 }).x - toPage({ xM: 0, yM: 0 }).x;
    expect(scaleBar.pixels).toBeCloseTo(length, 9);
  });

  it.each([
    [1, 1],
    [4.99, 2],
    [5, 5],
    [999, 500],
    [1000, 1000],
    [0.03, 0.02],
  ])('rounds %d down to %d', (length, rounded) => expect(roundDown(length)).toBe(rounded));

  it('joins the points of a line by their place along it, however it runs', () => {
    const order = (points: { xM: number; yM: number }[]) => alongLine(points).map((point) => point.yM);
    expect(
      order([
        { xM: 0, yM: 300 },
        { xM: 1, yM: 100 },
        { xM: 0, yM: 200 },
      ]).join(),
    ).toMatch(/^(100,200,300|300,200,100)$/);
  });

  it('puts names where they cover no mark and no other name, and leaves one out where there is no place', () => {
    const [alone] = placeLabels([{ x: 100, y: 100, name: 'S-01' }]);
    expect(alone?.anchor).toBe('start');
    const [beside] = placeLabels([
      { x: 100, y: 100, name: 'S-01' },
      { x: 125, y: 100, name: 'S-02' },
    ]);
    expect(beside?.anchor).toBe('middle');
    const crowd = Array.from({ length: 25 }, (_, i) => ({
      x: 100 + 10 * (i % 5),
      y: 100 + 10 * Math.floor(i / 5),
      name: `S-${i}`,
    }));
    expect(placeLabels(crowd)[12]).toBeNull();
  });

  it('names a sounding, the borehole at its place and its neighbours on both sides', () => {
    const line = [0, 27, 54, 81, 108].map((x, i) => ({ x, y: 100, name: `S-0${i}` }));
    const places = placeLabels([...line, { x: 54, y: 98, name: 'BH-1' }]);
    expect(places.every((found) => found !== null)).toBe(true);
    expect([places[2], places[5]].map((found) => found?.isFar)).toEqual([false, false]);
  });

  it('names a borehole and the sounding at its place first where not every name has room', () => {
    const line = Array.from({ length: 9 }, (_, i) => ({ x: 13 * i, y: 100, name: `S-0${i}` }));
    const places = placeLabels([...line, { x: 52, y: 98, name: 'BH-1' }]);
    expect(places.some((found) => found === null)).toBe(true);
    expect([places[4], places[9]].map((found) => found?.isFar)).toEqual([false, false]);
  });

  it('places no far name where none is wanted', () => {
    const line = [0, 1, 2, 3, 4].map((i) => ({ x: 100 + 15 * i, y: 100, name: `S-0${i}` }));
    const far = (mayBeFar: boolean) => placeLabels(line, mayBeFar).filter((found) => found?.isFar).length;
    expect([far(true) > 0, far(false)]).toEqual([true, 0]);
  });

  it('leads to no far name through a nearer one', () => {
    const around = [
      { x: 75, y: 100, name: '' },
      { x: 125, y: 100, name: '' },
      { x: 100, y: 124, name: '' },
    ];
    const mark = { x: 100, y: 100, name: 'S-01' };
    const beside = { x: 60, y: 82, name: 'S-23456' };
    expect(placeLabels([mark, ...around])[0]).toMatchObject({ dx: 0, dy: -14 });
    expect(placeLabels([beside, mark, ...around])[1]).toBeNull();
  });
});

const progress = { soundings: 8, measured: 6, fitted: 4, interpreted: 2, inReview: 1, accepted: 1 };

describe('the way of a survey', () => {
  it('is told by number and by share of all soundings', () => {
    expect(progressSteps(progress).map(({ count, share }) => [count, share])).toEqual([
      [8, 1],
      [6, 0.75],
      [4, 0.5],
      [2, 0.25],
      [1, 0.125],
    ]);
    expect(progressSteps({ ...progress, soundings: 0 }).every(({ share }) => share === 0)).toBe(true);
  });
});

describe('what waits for a person', () => {
  const survey = (can: object, counts: object = {}) =>
    ({
      id: 's',
      can: { decide: false, submit: false, ...can },
      progress: { ...progress, ...counts },
    }) as never;

  it('is decisions for who decides, asked changes for who submits', () => {
    const states = (...surveys: never[]) => waitingQuestions(surveys).map(({ state }) => state);
    expect(states(survey({ decide: true }))).toEqual(['in-review']);
    expect(states(survey({ submit: true }))).toEqual(['changes-asked']);
    expect(states(survey({}))).toEqual([]);
    expect(states(survey({ decide: true }, { inReview: 0 }))).toEqual([]);
    expect(states(survey({ submit: true }, { interpreted: 0 }))).toEqual([]);
  });
});
