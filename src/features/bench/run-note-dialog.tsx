import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import {
  runSchema,
  runSummarySchema,
  updateRunNoteSchema,
  type RunSummary,
} from '../../../server/contract/runs';
import { currentOf } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { letterOfRun } from '../../runs/run-title';
import { Button } from '../../ui/button';
import { ConflictDialog } from '../../ui/conflict-dialog';
import { Dialog } from '../../ui/dialog';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { Textarea } from '../../ui/textarea';
import { mergeRows, versionFields } from '../../ui/version-fields';
import { useUpdateRunNote } from './bench-mutations';

const noteFormSchema = updateRunNoteSchema.pick({ label: true, note: true }).required();
type NoteForm = z.infer<typeof noteFormSchema>;

const LABELS = { label: 'Label', note: 'Note' } as const;
const currentSchema = z.union([runSchema, runSummarySchema, runSummarySchema.shape.note]);

/** The note that stands now, whichever of its wrappings the answer has. */
function noteOf(error: unknown): RunSummary['note'] | null {
  const current = currentOf(error, currentSchema);
  if (current === null) return null;
  return 'pinned' in current ? current : current.note;
}

/** Words about a run; the run itself never changes. */
export function RunNoteDialog({ run, onClose }: { run: RunSummary; onClose: () => void }) {
  // What the writer began with stays the base, however often the Ledger is fetched meanwhile.
  const [base] = useState(run.note);
  const update = useUpdateRunNote(run.soundingId);
  const form = useForm<NoteForm>({
    resolver: formResolver(noteFormSchema),
    defaultValues: { label: base.label, note: base.note },
  });
  const theirs = noteOf(update.error);
  const save = (values: NoteForm, version: number) =>
    update.mutate({ runId: run.id, change: values, version }, { onSuccess: onClose });
  if (theirs)
    return (
      <ConflictDialog
        subject={`The note of run ${letterOfRun(run)}`}
        fields={versionFields(LABELS, { base, mine: form.getValues(), theirs })}
        working={update.isPending}
        onClose={() => update.reset()}
        onResolve={(taken) => save(mergeRows(form.getValues(), theirs, taken), theirs.version)}
      />
    );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Run ${letterOfRun(run)}: label and note`}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button
            kind="main"
            loading={update.isPending}
            onClick={form.handleSubmit((values) => save(values, base.version))}
          >
            Save note
          </Button>
        </>
      }
    >
      <form
        className="flex flex-col gap-4"
        onSubmit={form.handleSubmit((values) => save(values, base.version))}
      >
        <FormErrors faults={formFaults(update.error, LABELS)} />
        <Field
          label="Label"
          hint="Shown in the Ledger in place of the count of beds"
          error={form.formState.errors.label?.message}
        >
          <Input {...form.register('label')} />
        </Field>
        <Field label="Note" error={form.formState.errors.note?.message}>
          <Textarea rows={5} {...form.register('note')} />
        </Field>
      </form>
    </Dialog>
  );
}
