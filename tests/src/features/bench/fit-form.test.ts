import { expect, it } from 'vitest';
import { fitSettingsSchema } from '../../../../server/contract/fit';
import {
  DEFAULT_FIT_FORM,
  faultsOfSettings,
  fitFormSchema,
  settingsOf,
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
