import { expect, it } from 'vitest';
import { fitSettingsSchema } from '../../../../server/contract/fit-settings';
import {
  DEFAULT_FIT_FORM,
  faultsOfSettings,
  fitFormSchema,
  settingsOf,
  settingsOfCount,
  shownChoices,
} from '../../../../src/features/bench/fit-form';

const model = { resistivity: [140, 12, 120], thickness: [3, 4] };

it('asks for the count to be found when nothing is held', () => {
  const settings = settingsOf(DEFAULT_FIT_FORM, model, []);
  expect(settings).toMatchObject({ layers: 'auto', fixed: [], seed: 1 });
  expect(settings.start).toBeUndefined();
  expect(fitSettingsSchema.safeParse(settings).success).toBe(true);
});

it('takes the count of the model as soon as a value of it is held', () => {
  const settings = settingsOf({ ...DEFAULT_FIT_FORM, layers: '5' }, model, ['thickness 1', 'resistivity 0']);
  expect(settings.layers).toBe(3);
  expect(settings.fixed).toEqual([
    { on: 'resistivity', index: 0, value: 140 },
    { on: 'thickness', index: 1, value: 4 },
  ]);
});

it('starts from the model when asked to', () => {
  expect(settingsOf({ ...DEFAULT_FIT_FORM, start: 'model' }, model, [])).toMatchObject({
    layers: 3,
    start: model,
  });
  expect(settingsOf({ ...DEFAULT_FIT_FORM, start: 'model' }, null, []).start).toBeUndefined();
});

it('shows the choices that the request is made from', () => {
  const asked = { layers: '5', start: 'model' } as const;
  for (const held of [[], ['thickness 1']])
    for (const shown of [null, model]) {
      const settings = settingsOf({ ...DEFAULT_FIT_FORM, ...asked }, shown, held);
      expect(shownChoices(asked, shown, held)).toEqual({
        layers: String(settings.layers),
        start: settings.start ? 'model' : 'curve',
        isCountOfModel: shown !== null,
      });
    }
  expect(shownChoices({ layers: '5', start: 'curve' }, model, [])).toMatchObject({
    layers: '5',
    start: 'curve',
    isCountOfModel: false,
  });
});

it('asks for one count of a run within the bounds that are set, else within those of the run', () => {
  const asked = fitSettingsSchema.parse({
    kind: 'layered',
    layers: 'auto',
    seed: 7,
    bounds: { resistivity: [1, 500], thickness: [0.5, 60] },
  });
  expect(settingsOfCount(DEFAULT_FIT_FORM, asked, model)).toEqual({
    kind: 'layered',
    outlierTolerant: false,
    layers: 3,
    seed: 7,
    bounds: asked.bounds,
    fixed: [],
    start: model,
  });
  const set = { ...DEFAULT_FIT_FORM, resistivityHigh: 2000, seed: 3 };
  expect(settingsOfCount(set, asked, model)).toMatchObject({
    seed: 3,
    bounds: { resistivity: [0.1, 2000], thickness: [0.5, 60] },
  });
});

it('asks for a smooth or stepped ground without beds, whatever is held', () => {
  for (const kind of ['smooth', 'stepped'] as const) {
    const settings = settingsOf({ ...DEFAULT_FIT_FORM, kind, layers: '5', outlierTolerant: true }, model, [
      'thickness 1',
    ]);
    expect(settings).toEqual({
      kind,
      seed: 1,
      bounds: { resistivity: [0.1, 1e5], thickness: [0.02, 1000] },
      outlierTolerant: true,
    });
    expect(fitSettingsSchema.safeParse(settings).success).toBe(true);
  }
});

it('tells a held value that lies outside the bounds by its bed', () => {
  const settings = settingsOf({ ...DEFAULT_FIT_FORM, resistivityHigh: 100 }, model, ['resistivity 2']);
  expect(faultsOfSettings(settings)).toEqual([
    'Held resistivity of bed 3, found 120: must lie within the bounds 0.1 to 100',
  ]);
});

it('refuses bounds the wrong way round', () => {
  const parsed = fitFormSchema.safeParse({ ...DEFAULT_FIT_FORM, thicknessLow: 5, thicknessHigh: 2 });
  expect(parsed.error?.issues.map((issue) => issue.path)).toEqual([['thicknessHigh']]);
});
