import { X } from 'lucide-react';
import { useFieldArray } from 'react-hook-form';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormNumber } from '../../ui/form-number';
import { IconButton } from '../../ui/icon-button';
import { Input } from '../../ui/input';
import type { BoreholeForm } from './borehole-fields';

export function WaterLevelRows({ form }: { form: BoreholeForm }) {
  const { control, register } = form;
  const { fields, append, remove } = useFieldArray({ control, name: 'waterLevels' });
  const errors = form.formState.errors.waterLevels;
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-1 font-semibold">Water levels</legend>
      <p className="mb-1 text-sm text-muted">Depth below ground; a negative depth stands above it.</p>
      {fields.map((field, i) => (
        <div key={field.id} className="grid grid-cols-[1fr_1fr_auto] gap-2 sm:grid-cols-[11rem_9rem_auto]">
          <Field label="Measured on" labelHidden={i > 0} error={errors?.[i]?.measuredOn?.message}>
            <Input type="date" figures {...register(`waterLevels.${i}.measuredOn`)} />
          </Field>
          <FormNumber
            control={control}
            name={`waterLevels.${i}.depthM`}
            label="Depth"
            labelHidden={i > 0}
            unit="m"
            min={-200}
            max={5000}
          />
          <IconButton
            className={i === 0 ? 'mt-5' : undefined}
            label={`Remove water level ${i + 1}`}
            icon={<X aria-hidden size={16} />}
            onClick={() => remove(i)}
          />
        </div>
      ))}
      <Button
        size="small"
        className="self-start"
        onClick={() => append({ measuredOn: '', depthM: Number.NaN })}
      >
        Add a water level
      </Button>
    </fieldset>
  );
}
