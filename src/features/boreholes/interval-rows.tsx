import { X } from 'lucide-react';
import { useFieldArray } from 'react-hook-form';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormNumber } from '../../ui/form-number';
import { IconButton } from '../../ui/icon-button';
import { Input } from '../../ui/input';
import type { BoreholeForm } from './borehole-fields';

/** The log: from, to and the driller's words; a new interval starts where the last one ends. */
export function IntervalRows({ form }: { form: BoreholeForm }) {
  const { control, register } = form;
  const { fields, append, remove } = useFieldArray({ control, name: 'intervals' });
  const errors = form.formState.errors.intervals;
  const add = () => {
    const last = form.getValues('intervals')?.at(-1);
    append({ topM: last?.baseM ?? 0, baseM: Number.NaN, description: '' });
  };
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-2 font-semibold">Log</legend>
      {fields.map((field, i) => (
        <div key={field.id} className="grid grid-cols-[1fr_1fr_auto] gap-2 sm:grid-cols-[7rem_7rem_1fr_auto]">
          <FormNumber
            control={control}
            name={`intervals.${i}.topM`}
            label="From"
            labelHidden={i > 0}
            unit="m"
            min={0}
            max={5000}
          />
          <FormNumber
            control={control}
            name={`intervals.${i}.baseM`}
            label="To"
            labelHidden={i > 0}
            unit="m"
            above={0}
            max={5000}
          />
          <Field
            label="Ground"
            labelHidden={i > 0}
            className="col-span-2 row-start-2 sm:col-span-1 sm:row-start-auto"
            error={errors?.[i]?.description?.message}
          >
            <Input placeholder="as the driller wrote it" {...register(`intervals.${i}.description`)} />
          </Field>
          <IconButton
            className={i === 0 ? 'mt-5' : undefined}
            label={`Remove interval ${i + 1}`}
            icon={<X aria-hidden size={16} />}
            onClick={() => remove(i)}
          />
        </div>
      ))}
      <Button size="small" className="self-start" onClick={add}>
        Add an interval
      </Button>
    </fieldset>
  );
}
