import type { UseFormReturn } from 'react-hook-form';
import { z } from 'zod';
import { createSurveySchema } from '../../../server/contract/surveys';
import { Field } from '../../ui/field';
import { FormNumber } from '../../ui/form-number';
import { Input } from '../../ui/input';
import { Textarea } from '../../ui/textarea';

/** The contract's object, with the error floor as people say it: in percent. */
export const surveyFormSchema = z.strictObject({
  name: createSurveySchema.shape.name,
  description: createSurveySchema.shape.description.unwrap(),
  grid: createSurveySchema.shape.grid.unwrap(),
  epsgCode: createSurveySchema.shape.epsgCode.unwrap(),
  errorFloorPercent: z.number().min(0.1).max(50),
});
export type SurveyFormValues = z.output<typeof surveyFormSchema>;

export const SURVEY_LABELS: Record<keyof SurveyFormValues, string> = {
  name: 'Name',
  description: 'Description',
  grid: 'Grid of x and y',
  epsgCode: 'EPSG code',
  errorFloorPercent: 'Error floor',
};

export const surveyBody = ({ errorFloorPercent, ...rest }: SurveyFormValues) => ({
  ...rest,
  errorFloor: Number((errorFloorPercent / 100).toPrecision(12)),
});

export const surveyValues = (survey: {
  name: string;
  description: string;
  grid: string;
  epsgCode: number | null;
  errorFloor: number;
}): SurveyFormValues => ({
  name: survey.name,
  description: survey.description,
  grid: survey.grid,
  epsgCode: survey.epsgCode,
  errorFloorPercent: Number((survey.errorFloor * 100).toPrecision(12)),
});

export function SurveyFields({ form }: { form: UseFormReturn<SurveyFormValues> }) {
  const { errors } = form.formState;
  return (
    <>
      <Field label={SURVEY_LABELS.name} required error={errors.name?.message}>
        <Input {...form.register('name')} />
      </Field>
      <Field label={SURVEY_LABELS.description} error={errors.description?.message}>
        <Textarea rows={3} {...form.register('description')} />
      </Field>
      <div className="grid items-start gap-4 sm:grid-cols-2">
        <Field
          label={SURVEY_LABELS.grid}
          hint="The name of the grid, or “own” for a local one"
          error={errors.grid?.message}
        >
          <Input {...form.register('grid')} />
        </Field>
        <FormNumber
          control={form.control}
          name="epsgCode"
          label={SURVEY_LABELS.epsgCode}
          hint="1024 to 32767, empty for a local grid"
          integer
          min={1024}
          max={32767}
        />
      </div>
      <FormNumber
        control={form.control}
        name="errorFloorPercent"
        label={SURVEY_LABELS.errorFloorPercent}
        hint="0.1 to 50 %. Added in quadrature to each reading’s own error; new runs use it, runs made before keep theirs."
        unit="%"
        required
        min={0.1}
        max={50}
        className="max-w-60"
      />
    </>
  );
}
