import { z } from 'zod';
import {
  DEFAULT_BOUNDS,
  fitSettingsSchema,
  type FitSettings,
  type FitSettingsInput,
  type LayeredEarthModel,
} from '../../../server/contract/fit-settings';
import { formatGiven } from '../../ui/format';
import type { ModelValue } from './hand-model';
import { heldKey } from './hand-model-store';

/** What a fit may make of the ground. */
export const GROUND_CHOICES = ['layered', 'smooth', 'stepped'] as const;

export const LAYER_CHOICES = ['auto', '1', '2', '3', '4', '5', '6', '7', '8'] as const;

const bound = (max: number) =>
  z
    .number({ error: 'write a number' })
    .gt(0, 'must be above 0')
    .max(max, `must be at most ${formatGiven(max)}`);

/** The controls of a fit as filled in; the contract's settings are made from it by `settingsOf`. */
export const fitFormSchema = z
  .strictObject({
    kind: z.enum(GROUND_CHOICES),
    outlierTolerant: z.boolean(),
    layers: z.enum(LAYER_CHOICES),
    /** 'fitting' until a person chooses: the model where it is by hand, else the curve. */
    start: z.enum(['fitting', 'curve', 'model']),
    resistivityLow: bound(1e9),
    resistivityHigh: bound(1e9),
    thicknessLow: bound(1e6),
    thicknessHigh: bound(1e6),
    seed: fitSettingsSchema.shape.seed.unwrap(),
  })
  .refine((form) => form.resistivityLow < form.resistivityHigh, {
    path: ['resistivityHigh'],
    message: 'must be above the lowest resistivity',
  })
  .refine((form) => form.thicknessLow < form.thicknessHigh, {
    path: ['thicknessHigh'],
    message: 'must be above the least thickness',
  });
export type FitForm = z.infer<typeof fitFormSchema>;

export const DEFAULT_FIT_FORM: FitForm = {
  kind: 'layered',
  outlierTolerant: false,
  layers: 'auto',
  start: 'fitting',
  resistivityLow: DEFAULT_BOUNDS.resistivity[0],
  resistivityHigh: DEFAULT_BOUNDS.resistivity[1],
  thicknessLow: DEFAULT_BOUNDS.thickness[0],
  thicknessHigh: DEFAULT_BOUNDS.thickness[1],
  seed: 1,
};

/** Every value of a model, resistivities first. */
export function valuesOfModel(earth: LayeredEarthModel): ModelValue[] {
  return [
    ...earth.resistivity.map((_, index): ModelValue => ({ on: 'resistivity', index })),
    ...earth.thickness.map((_, index): ModelValue => ({ on: 'thickness', index })),
  ];
}

/** What the controls stand for beside the model that is shown: the same for the eye and for the request. */
export interface ShownChoices {
  start: Exclude<FitForm['start'], 'fitting'>;
  layers: FitForm['layers'];
  /** Values are held or the fit starts from the model, so its count of beds is the one asked for. */
  isCountOfModel: boolean;
}

export function shownChoices(
  form: Pick<FitForm, 'layers' | 'start'>,
  model: LayeredEarthModel | null,
  held: readonly string[],
  isByHand = false,
): ShownChoices {
  const layers = LAYER_CHOICES.find((choice) => choice === String(model?.resistivity.length));
  if (!layers) return { start: 'curve', layers: form.layers, isCountOfModel: false };
  const usual = isByHand ? 'model' : 'curve';
  const start = form.start === 'fitting' ? usual : form.start;
  const isCountOfModel = held.length > 0 || start === 'model';
  return { start, layers: isCountOfModel ? layers : form.layers, isCountOfModel };
}

/**
 * The request for a run. A model that holds values, or that is started from, states the count of beds;
 * what is asked for otherwise then has no say.
 */
export function settingsOf(
  form: FitForm,
  model: LayeredEarthModel | null,
  held: readonly string[],
  isByHand = false,
): FitSettingsInput {
  const { seed, outlierTolerant } = form;
  if (form.kind !== 'layered') return { kind: form.kind, seed, bounds: boundsOf(form), outlierTolerant };
  const { start, layers, isCountOfModel } = shownChoices(form, model, held, isByHand);
  return {
    kind: 'layered',
    outlierTolerant,
    layers: layers === 'auto' ? 'auto' : Number(layers),
    seed,
    bounds: boundsOf(form),
    fixed:
      model && isCountOfModel
        ? valuesOfModel(model)
            .filter((value) => held.includes(heldKey(value)))
            .map(({ on, index }) => ({ on, index, value: model[on][index] ?? Number.NaN }))
        : [],
    ...(model && start === 'model' ? { start: model } : {}),
  };
}

/**
 * The request for one count of beds out of those that a run tried, starting from what it found there. Bounds and seed that
 * were set since count; where they stand as usual, the run's own are kept.
 */
export function settingsOfCount(
  form: FitForm,
  asked: FitSettings,
  earth: LayeredEarthModel,
): FitSettingsInput {
  const bounds = boundsOf(form);
  const pick = (on: ModelValue['on']) =>
    bounds[on].every((bound, i) => bound === DEFAULT_BOUNDS[on][i]) ? asked.bounds[on] : bounds[on];
  return {
    kind: 'layered',
    layers: earth.resistivity.length,
    outlierTolerant: asked.outlierTolerant,
    seed: form.seed === DEFAULT_FIT_FORM.seed ? asked.seed : form.seed,
    bounds: { resistivity: pick('resistivity'), thickness: pick('thickness') },
    fixed: [],
    start: earth,
  };
}

const boundsOf = (form: FitForm): FitSettings['bounds'] => ({
  resistivity: [form.resistivityLow, form.resistivityHigh],
  thickness: [form.thicknessLow, form.thicknessHigh],
});

/** Faults the contract finds in the settings, in words of the Bench. */
export function faultsOfSettings(settings: FitSettingsInput): string[] {
  const parsed = fitSettingsSchema.safeParse(settings);
  if (parsed.success) return [];
  return parsed.error.issues.map((issue) => {
    const [field, position] = issue.path;
    const fixed = field === 'fixed' && typeof position === 'number' ? settings.fixed?.[position] : undefined;
    if (!fixed) return `${issue.path.join(' ')}: ${issue.message}`;
    const quantity = fixed.on === 'resistivity' ? 'resistivity' : 'thickness';
    return `Held ${quantity} of bed ${fixed.index + 1}, found ${formatGiven(fixed.value)}: ${issue.message}`;
  });
}
