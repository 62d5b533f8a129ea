import type { UseFormReturn } from 'react-hook-form';
import { Checkbox } from '../../ui/checkbox';
import { FormNumber } from '../../ui/form-number';
import type { FitForm } from './fit-form';

/** Bounds, outliers and seed, folded away: most fits leave them as they are. */
export function FitBoundsFields({ form }: { form: UseFormReturn<FitForm> }) {
  const { errors } = form.formState;
  const hasFault = Object.keys(errors).some((name) => !['kind', 'layers', 'start'].includes(name));
  return (
    <details open={hasFault || undefined} className="max-w-2xl">
      <summary className="min-h-6 w-fit rounded text-sm text-muted hover:text-ink touch:min-h-11">
        Bounds, outliers and seed
      </summary>
      <div className="mt-2 grid grid-cols-2 gap-3 sm:grid-cols-3">
        <FormNumber
          control={form.control}
          name="resistivityLow"
          label="Lowest resistivity"
          unit="Ω·m"
          above={0}
        />
        <FormNumber
          control={form.control}
          name="resistivityHigh"
          label="Highest resistivity"
          unit="Ω·m"
          above={0}
        />
        <span className="hidden sm:block" />
        <FormNumber control={form.control} name="thicknessLow" label="Least thickness" unit="m" above={0} />
        <FormNumber
          control={form.control}
          name="thicknessHigh"
          label="Greatest thickness"
          unit="m"
          above={0}
        />
        <FormNumber
          control={form.control}
          name="seed"
          label="Seed"
          hint="The same seed gives the same fit"
          min={0}
          integer
        />
      </div>
      <Checkbox className="mt-3" label="Outliers count for less" {...form.register('outlierTolerant')} />
    </details>
  );
}
