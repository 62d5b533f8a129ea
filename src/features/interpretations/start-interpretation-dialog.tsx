import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import type { z } from 'zod';
import { createInterpretationSchema } from '../../../server/contract/interpretations';
import type { RunSummary } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { isRejected, REJECTED_WORDS } from '../../runs/rejected-fit';
import { byStanding, hasBeds } from '../../runs/run-standing';
import { letterOfRun, titleOfRun } from '../../runs/run-title';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { formatMisfit } from '../../ui/format';
import { Input } from '../../ui/input';
import { Select } from '../../ui/select';
import { useCreateInterpretation } from './interpretation-mutations';

export interface StartInterpretationDialogProps {
  sounding: Sounding;
  /** Finished runs, newest first. */
  runs: readonly RunSummary[];
  /** The run to begin with; any other word leaves the choice open. */
  runId: string;
  onClose: () => void;
}

function optionOf(run: RunSummary): { value: string; label: string } {
  const words = [
    `${letterOfRun(run)}: ${titleOfRun(run)}`,
    run.outcome ? `χ²/N ${formatMisfit(run.outcome.chi2PerReading)}` : null,
    isRejected(run.outcome) ? REJECTED_WORDS : null,
  ];
  return { value: run.id, label: words.filter((word) => word !== null).join(', ') };
}

/** Runs that explain the readings first, and of these the one that stands for the sounding. */
const likeliest = (runs: readonly RunSummary[]): RunSummary | undefined =>
  runs.toSorted(
    (a, b) => Number(isRejected(a.outcome)) - Number(isRejected(b.outcome)) || byStanding(a, b),
  )[0];

export function StartInterpretationDialog(props: StartInterpretationDialogProps) {
  const { sounding, runId, onClose } = props;
  const runs = props.runs.filter(hasBeds);
  const navigate = useNavigate();
  const create = useCreateInterpretation(sounding.id);
  const first = runs.find((run) => run.id === runId) ?? likeliest(runs);
  const form = useForm<z.input<typeof createInterpretationSchema>>({
    resolver: formResolver(createInterpretationSchema),
    defaultValues: { runId: first?.id ?? '', title: `Ground at ${sounding.name}` },
  });
  const begin = form.handleSubmit((values) =>
    create.mutate(values, {
      onSuccess: (made) =>
        void navigate(addressOf('interpretation', { soundingId: sounding.id, interpretationId: made.id })),
    }),
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Interpret a run"
      description="The interpretation keeps to this run, with its readings and settings as they were."
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button kind="main" loading={create.isPending} onClick={begin}>
            Begin
          </Button>
        </>
      }
    >
      <form className="flex flex-col gap-4" onSubmit={begin}>
        <FormErrors title="Not begun" faults={formFaults(create.error, { runId: 'Run', title: 'Title' })} />
        <Field label="Run" error={form.formState.errors.runId?.message}>
          <Select options={runs.map(optionOf)} {...form.register('runId')} />
        </Field>
        <Field label="Title" required error={form.formState.errors.title?.message}>
          <Input {...form.register('title')} />
        </Field>
      </form>
    </Dialog>
  );
}
