import { Controller, type UseFormReturn } from 'react-hook-form';
import { Field } from '../ui/field';
import { FormNumber } from '../ui/form-number';
import { Input } from '../ui/input';
import { Select } from '../ui/select';
import { Textarea } from '../ui/textarea';
import { LinePicker } from './line-picker';
import { SOUNDING_LABELS as LABELS, type SoundingFormValues } from './sounding-form-schema';
import { SPREAD_OPTIONS } from './spread-words';

interface SoundingFieldsProps {
  form: UseFormReturn<SoundingFormValues>;
  surveyId: string;
  /** Why the spread cannot be changed, where it cannot. */
  spreadLocked?: string;
}

export function SoundingFields({ form, surveyId, spreadLocked }: SoundingFieldsProps) {
  const { errors } = form.formState;
  const { register, control } = form;
  return (
    <div className="grid items-start gap-4 sm:grid-cols-2">
      <Field label={LABELS.name} required error={errors.name?.message}>
        <Input {...register('name')} />
      </Field>
      <Controller
        control={control}
        name="lineId"
        render={({ field }) => (
          <LinePicker surveyId={surveyId} value={field.value} onChange={field.onChange} />
        )}
      />
      <Field label={LABELS.spreadType} hint={spreadLocked} error={errors.spreadType?.message}>
        <Select
          options={SPREAD_OPTIONS.map((option) => ({
            ...option,
            disabled: spreadLocked !== undefined && option.value !== form.getValues('spreadType'),
          }))}
          {...register('spreadType')}
        />
      </Field>
      <Field label={LABELS.measuredOn} error={errors.measuredOn?.message}>
        <Input
          type="date"
          figures
          {...register('measuredOn', {
            setValueAs: (text: string | null) => (text === '' ? null : text),
          })}
        />
      </Field>
      <Position form={form} />
      <Field label={LABELS.crew} error={errors.crew?.message}>
        <Input {...register('crew')} />
      </Field>
      <Field label={LABELS.instrument} error={errors.instrument?.message}>
        <Input {...register('instrument')} />
      </Field>
      <Field label={LABELS.note} className="sm:col-span-2" error={errors.note?.message}>
        <Textarea rows={3} {...register('note')} />
      </Field>
    </div>
  );
}

function Position({ form }: { form: UseFormReturn<SoundingFormValues> }) {
  const { control, register } = form;
  return (
    <>
      <FormNumber control={control} name="xM" label={LABELS.xM} unit="m" min={-1e8} max={1e8} />
      <FormNumber control={control} name="yM" label={LABELS.yM} unit="m" min={-1e8} max={1e8} />
      <FormNumber
        control={control}
        name="elevationM"
        label={LABELS.elevationM}
        unit="m"
        min={-500}
        max={9000}
      />
      <Field
        label={LABELS.elevationDatum}
        hint="What the elevation counts from"
        error={form.formState.errors.elevationDatum?.message}
      >
        <Input {...register('elevationDatum')} />
      </Field>
      <FormNumber
        control={control}
        name="azimuthDeg"
        label={LABELS.azimuthDeg}
        hint="Degrees from north, 0 to below 360"
        unit="°"
        min={0}
        below={360}
      />
      <span aria-hidden className="hidden sm:block" />
    </>
  );
}
