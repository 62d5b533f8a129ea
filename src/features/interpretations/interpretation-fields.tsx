import type { UseFormReturn } from 'react-hook-form';
import type { Run } from '../../../server/contract/runs';
import { Field } from '../../ui/field';
import { FormNumber } from '../../ui/form-number';
import { Input } from '../../ui/input';
import { Select } from '../../ui/select';
import { Textarea } from '../../ui/textarea';
import { BedBasis } from './bed-basis';
import type { InterpretationForm } from './interpretation-form';
import { BED_ROLE_WORDS, CONFIDENCE_WORDS, optionsOf } from './interpretation-words';

const ROLE_OPTIONS = optionsOf(BED_ROLE_WORDS);
const CONFIDENCE_OPTIONS = optionsOf(CONFIDENCE_WORDS);

export interface InterpretationFieldsProps {
  form: UseFormReturn<InterpretationForm>;
  run: Run;
}

export function InterpretationFields({ form, run }: InterpretationFieldsProps) {
  const { errors } = form.formState;
  return (
    <div className="flex max-w-4xl min-w-0 flex-col gap-5">
      <Field label="Title" required error={errors.title?.message}>
        <Input {...form.register('title')} />
      </Field>
      <section aria-label="Beds">
        <ol className="border-t border-rule">
          {form.getValues('beds').map((bed, index) => (
            <BedFields key={bed.layerIndex} form={form} run={run} index={index} />
          ))}
        </ol>
        <p className="mt-2 text-sm text-muted">
          Resistivity alone never names one ground: name the most likely, and what else it could be.
        </p>
      </section>
      <FormNumber
        control={form.control}
        name="waterLevelDepthM"
        label="Water level"
        hint="Depth below ground, m; negative above ground; empty where it is not known"
        unit="m"
        min={-200}
        max={5000}
        className="max-w-64"
      />
      <Field
        label="Narrative"
        hint="What the ground may be, on what grounds, and what is still open"
        error={errors.narrative?.message}
      >
        <Textarea rows={9} {...form.register('narrative')} />
      </Field>
    </div>
  );
}

function BedFields({ form, run, index }: InterpretationFieldsProps & { index: number }) {
  const layerIndex = form.getValues(`beds.${index}.layerIndex`);
  const errors = form.formState.errors.beds?.[index];
  const words = `of bed ${layerIndex + 1}`;
  return (
    <li className="grid gap-x-6 gap-y-3 border-b border-rule py-4 sm:grid-cols-[10rem_minmax(0,1fr)]">
      {run.result ? <BedBasis result={run.result} layerIndex={layerIndex} /> : null}
      <div className="grid min-w-0 gap-3 sm:grid-cols-2">
        <Field
          label={
            <>
              Ground <span className="sr-only">{words}</span>
            </>
          }
          className="sm:col-span-2"
          error={errors?.ground?.message}
        >
          <Input {...form.register(`beds.${index}.ground`)} />
        </Field>
        <Field
          label={
            <>
              Role <span className="sr-only">{words}</span>
            </>
          }
        >
          <Select options={ROLE_OPTIONS} {...form.register(`beds.${index}.role`)} />
        </Field>
        <Field
          label={
            <>
              Confidence <span className="sr-only">{words}</span>
            </>
          }
        >
          <Select options={CONFIDENCE_OPTIONS} {...form.register(`beds.${index}.confidence`)} />
        </Field>
        <Field
          label={
            <>
              Other candidates <span className="sr-only">{words}</span>
            </>
          }
          className="sm:col-span-2"
          error={errors?.otherCandidates?.message}
        >
          <Input {...form.register(`beds.${index}.otherCandidates`)} />
        </Field>
      </div>
    </li>
  );
}
