import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field, type FieldProps } from './field';
import { NumberInput } from './number-input';
import type { NumberLimits } from './parse-number';

export interface FormNumberProps<Values extends FieldValues, Output> extends NumberLimits {
  control: Control<Values, unknown, Output>;
  name: FieldPath<Values>;
  label: FieldProps['label'];
  hint?: FieldProps['hint'];
  unit?: string;
  required?: boolean;
  labelHidden?: boolean;
  className?: string;
  disabled?: boolean;
}

/** A number of a form. Text that is no number is kept in the form as NaN, so that it cannot be sent as "empty". */
export function FormNumber<Values extends FieldValues, Output>(props: FormNumberProps<Values, Output>) {
  const { control, name, label, hint, required, labelHidden, className, ...input } = props;
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => {
        const value: unknown = field.value;
        const number = typeof value === 'number' && !Number.isNaN(value) ? value : null;
        return (
          <Field
            label={label}
            hint={hint}
            required={required ?? false}
            labelHidden={labelHidden ?? false}
            {...(className === undefined ? {} : { className })}
            error={Number.isNaN(value) ? undefined : fieldState.error?.message}
          >
            <NumberInput
              {...input}
              ref={field.ref}
              onBlur={field.onBlur}
              value={number}
              onValueChange={(next, fault) => field.onChange(fault === null ? next : Number.NaN)}
            />
          </Field>
        );
      }}
    />
  );
}
