import { Play } from 'lucide-react';
import { useEffect, useState } from 'react';
import { useController, useForm } from 'react-hook-form';
import type { FitSettings, FitSettingsInput, LayeredEarthModel } from '../../../server/contract/fit-settings';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors, type FormFault } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { formatCount } from '../../ui/format';
import { Select } from '../../ui/select';
import { FitBoundsFields } from './fit-bounds-fields';
import {
  DEFAULT_FIT_FORM,
  faultsOfSettings,
  fitFormSchema,
  LAYER_CHOICES,
  settingsOf,
  settingsOfCount,
  shownChoices,
  type FitForm,
} from './fit-form';

/** What can be asked for from outside the controls, as they stand. */
export interface FitCommands {
  fit: () => void;
  /** One count of beds of the run that is shown, from the model found for it. */
  fitCount: (asked: FitSettings, earth: LayeredEarthModel) => void;
}

export interface FitControlsProps {
  /** The model drawn now; a fit may start from it and hold values of it. */
  model: LayeredEarthModel | null;
  /** The model was made or changed by hand, so a fit starts from it unless told otherwise. */
  isByHand: boolean;
  held: readonly string[];
  onRelease: () => void;
  onFit: (settings: FitSettingsInput) => void;
  isAsking: boolean;
  faults: readonly FormFault[];
  /** Called with what the F key and the counts of beds ask for. */
  onReady: (commands: FitCommands) => void;
}

const LAYER_OPTIONS = LAYER_CHOICES.map((value) => ({
  value,
  label: value === 'auto' ? 'Find the count' : formatCount(Number(value), 'bed'),
}));

const START_OPTIONS = [
  { value: 'curve', label: 'From the curve' },
  { value: 'model', label: 'From this model' },
] as const;

const GROUND_OPTIONS = [
  { value: 'layered', label: 'Beds' },
  { value: 'smooth', label: 'Smooth' },
  { value: 'stepped', label: 'Few steps' },
] as const;

/** Everything a fit is asked for with, and the one button that asks. */
export function FitControls(props: FitControlsProps) {
  const { model, held, isByHand, onFit, onReady, isAsking, onRelease } = props;
  const [ownFaults, setOwnFaults] = useState<readonly FormFault[]>([]);
  const form = useForm<FitForm>({
    resolver: formResolver(fitFormSchema),
    defaultValues: DEFAULT_FIT_FORM,
  });
  const start = useController({ control: form.control, name: 'start' }).field;
  const layers = useController({ control: form.control, name: 'layers' }).field;
  const kind = useController({ control: form.control, name: 'kind' }).field;
  const isBeds = kind.value === 'layered';
  const shown = shownChoices({ layers: layers.value, start: start.value }, model, held, isByHand);
  const request = (settings: FitSettingsInput) => {
    const faults = faultsOfSettings(settings);
    setOwnFaults(faults.map((message) => ({ message })));
    if (faults.length === 0) onFit(settings);
  };
  const ask = form.handleSubmit((values) => request(settingsOf(values, model, held, isByHand)));
  useEffect(() =>
    onReady({
      fit: () => void ask(),
      fitCount: (asked, earth) =>
        void form.handleSubmit((values) => request(settingsOfCount(values, asked, earth)))(),
    }),
  );
  return (
    <form onSubmit={ask} aria-label="Fit" className="flex flex-col gap-3">
      <div className="flex flex-wrap items-end gap-x-3 gap-y-3">
        <Button kind="main" type="submit" loading={isAsking} icon={<Play aria-hidden size={14} />}>
          {isBeds ? 'Fit beds' : 'Fit ground'}
        </Button>
        <Field label="Ground" className="w-28">
          <Select {...kind} options={GROUND_OPTIONS} />
        </Field>
        {isBeds ? (
          <>
            <Field label="Beds" className="w-36">
              <Select
                {...layers}
                value={shown.layers}
                disabled={shown.isCountOfModel}
                options={LAYER_OPTIONS}
              />
            </Field>
            <Field label="Start" className="w-36">
              <Select
                {...start}
                value={shown.start}
                options={model ? START_OPTIONS : START_OPTIONS.slice(0, 1)}
              />
            </Field>
          </>
        ) : null}
        {isBeds && held.length > 0 ? (
          <p className="flex min-h-8 items-center gap-2 text-sm text-muted">
            {formatCount(held.length, 'value')} held
            <Button kind="quiet" size="small" onClick={onRelease}>
              Release all
            </Button>
          </p>
        ) : null}
      </div>
      {isBeds && shown.isCountOfModel ? (
        <p className="text-sm text-muted">
          {held.length > 0 ? 'Held values belong to this model' : 'The fit starts from this model'}, so it has{' '}
          {formatCount(Number(shown.layers), 'bed')}.
        </p>
      ) : null}
      {isBeds && isByHand && shown.start === 'curve' ? (
        <p className="text-sm text-muted">
          The fit starts from the curve
          {held.length > 0 ? '; of this model only held values count' : '; this model has no part in it'}.
        </p>
      ) : null}
      <FitBoundsFields form={form} />
      <FormErrors title="Not asked for" faults={[...ownFaults, ...props.faults]} />
    </form>
  );
}
