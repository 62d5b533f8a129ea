import type { UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import type { writeBoreholeSchema } from '../../../server/contract/surveys';
import { Field } from '../../ui/field';
import { FormNumber } from '../../ui/form-number';
import { Input } from '../../ui/input';
import { Textarea } from '../../ui/textarea';
import { BOREHOLE_LABELS as LABELS, type BoreholeValues } from './borehole-values';
import { IntervalRows } from './interval-rows';
import { WaterLevelRows } from './water-level-rows';

export type BoreholeForm = UseFormReturn<z.input<typeof writeBoreholeSchema>, unknown, BoreholeValues>;

export const dateOrNull = { setValueAs: (text: string | null) => (text === '' ? null : text) };

export function BoreholeFields({ form }: { form: BoreholeForm }) {
  const { control, register } = form;
  const { errors } = form.formState;
  return (
    <>
      <div className="grid items-start gap-4 sm:grid-cols-3">
        <Field label={LABELS.name} required error={errors.name?.message}>
          <Input {...register('name')} />
        </Field>
        <FormNumber
          control={control}
          name="depthM"
          label={LABELS.depthM}
          unit="m"
          required
          above={0}
          max={5000}
        />
        <Field label={LABELS.drilledOn} error={errors.drilledOn?.message}>
          <Input type="date" figures {...register('drilledOn', dateOrNull)} />
        </Field>
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
      </div>
      <IntervalRows form={form} />
      <WaterLevelRows form={form} />
      <Field label={LABELS.note} error={errors.note?.message}>
        <Textarea rows={2} {...register('note')} />
      </Field>
    </>
  );
}
