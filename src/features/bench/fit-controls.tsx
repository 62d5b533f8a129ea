import { Play } from 'lucide-react';
import { useEffect, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import type { FitSettingsInput, LayeredEarthModel } from '../../../server/contract/fit';
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
  type FitForm,
} from './fit-form';

export interface FitControlsProps {
  /** The model drawn now; a fit may start from it and hold values of it. */
  model: LayeredEarthModel | null;
  held: readonly string[];
  onRelease: () => void;
  onFit: (settings: FitSettingsInput) => void;
  isAsking: boolean;
  faults: readonly FormFault[];
  /** Called with a function that asks for the fit as the controls stand, for the F key. */
  onReady: (fit: () => void) => void;
}

const LAYER_OPTIONS = LAYER_CHOICES.map((value) => ({
  value,
  label: value === 'auto' ? 'Find the count' : formatCount(Number(value), 'bed'),
}));

const START_OPTIONS = [
  { value: 'curve', label: 'From the curve' },
  { value: 'model', label: 'From this model' },
] as const;

/** Everything a fit is asked for with, and the one button that asks. */
export function FitControls(props: FitControlsProps) {
  const { model, held, onFit, onReady, isAsking, onRelease } = props;
  const [ownFaults, setOwnFaults] = useState<readonly FormFault[]>([]);
  const form = useForm<FitForm>({
    resolver: formResolver(fitFormSchema),
    defaultValues: DEFAULT_FIT_FORM,
  });
  const start = useWatch({ control: form.control, name: 'start' });
  const count = model?.resistivity.length ?? 0;
  const isCountOfModel = model !== null && (held.length > 0 || start === 'model');
  const ask = form.handleSubmit((values) => {
    const settings = settingsOf(values, model, held);
    const faults = faultsOfSettings(settings);
    setOwnFaults(faults.map((message) => ({ message })));
    if (faults.length === 0) onFit(settings);
  });
  useEffect(() => onReady(() => void ask()));
  return (
    <form onSubmit={ask} aria-label="Fit" className="flex flex-col gap-3">
      <div className="flex flex-wrap items-end gap-x-3 gap-y-3">
        <Button kind="main" type="submit" loading={isAsking} icon={<Play aria-hidden size={14} />}>
          Fit beds
        </Button>
        {isCountOfModel ? (
          // Keyed apart: the browser's list must not carry its choice from one of the two to the other.
          <Field key="of model" label="Beds" className="w-40">
            <Select
              value={String(count)}
              disabled
              options={[{ value: String(count), label: formatCount(count, 'bed') }]}
            />
          </Field>
        ) : (
          <Field key="asked" label="Beds" className="w-40">
            <Select options={LAYER_OPTIONS} {...form.register('layers')} />
          </Field>
        )}
        <Field label="Start" className="w-40">
          <Select options={model ? START_OPTIONS : START_OPTIONS.slice(0, 1)} {...form.register('start')} />
        </Field>
        {held.length > 0 ? (
          <p className="flex min-h-8 items-center gap-2 text-sm text-muted">
            {formatCount(held.length, 'value')} held
            <Button kind="quiet" size="small" onClick={onRelease}>
              Release all
            </Button>
          </p>
        ) : null}
      </div>
      {isCountOfModel ? (
        <p className="text-sm text-muted">
          {held.length > 0 ? 'Held values belong to this model' : 'The fit starts from this model'}, so it has{' '}
          {formatCount(count, 'bed')}.
        </p>
      ) : null}
      <FitBoundsFields form={form} />
      <FormErrors title="Not asked for" faults={[...ownFaults, ...props.faults]} />
    </form>
  );
}
