import { useEffect, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useBlocker } from 'react-router-dom';
import { interpretationSchema, type Interpretation } from '../../../server/contract/interpretations';
import type { Run } from '../../../server/contract/runs';
import type { Sounding } from '../../../server/contract/soundings';
import { currentOf } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { ConfirmDialog } from '../../ui/confirm-dialog';
import { ConflictDialog } from '../../ui/conflict-dialog';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Notice } from '../../ui/notice';
import { showToast } from '../../ui/show-toast';
import {
  formOf,
  interpretationFormSchema,
  interpretationVersions,
  mergedInterpretation,
  type InterpretationForm,
} from './interpretation-form';
import { InterpretationFields } from './interpretation-fields';
import { DISCARDED } from './discard-draft';
import { InterpretationGround } from './interpretation-ground';
import { InterpretationText } from './interpretation-text';
import { useSaveInterpretation } from './interpretation-mutations';

export interface InterpretationEditorProps {
  sounding: Sounding;
  interpretation: Interpretation;
  run: Run;
  onDirtyChange: (isDirty: boolean) => void;
}

const FIELD_LABELS = {
  title: 'Title',
  narrative: 'Narrative',
  waterLevelDepthM: 'Water level',
  beds: 'Bed',
  ground: 'ground',
  otherCandidates: 'other candidates',
} as const;

/** The interpretation for one who writes it. What is written is kept until it is saved or given up. */
export function InterpretationEditor(props: InterpretationEditorProps) {
  const { sounding, interpretation, run, onDirtyChange } = props;
  // The version the writing began with; a newer one from someone else is told, never slipped underneath.
  const [base, setBase] = useState(interpretation);
  const save = useSaveInterpretation(interpretation.id);
  const form = useForm<InterpretationForm>({
    resolver: formResolver(interpretationFormSchema),
    defaultValues: formOf(base),
  });
  const { isDirty } = form.formState;
  useEffect(() => onDirtyChange(isDirty), [isDirty, onDirtyChange]);
  const takeUp = (next: Interpretation) => {
    setBase(next);
    form.reset(formOf(next));
    save.reset();
  };
  const send = (change: InterpretationForm, version: number) =>
    save.mutate(
      { change, version },
      {
        onSuccess: (saved) => {
          takeUp(saved);
          showToast({ kind: 'good', title: 'Interpretation saved' });
        },
      },
    );
  const submit = form.handleSubmit((values) => send(values, base.version));
  const theirs = currentOf(save.error, interpretationSchema);
  return (
    <form onSubmit={submit} className="flex flex-col gap-5" aria-label="Interpretation">
      <h1 className="sr-only text-xl font-semibold print:not-sr-only">{base.title}</h1>
      {interpretation.version > base.version && !theirs ? (
        <NewerVersion isDirty={isDirty} onTakeUp={() => takeUp(interpretation)} />
      ) : null}
      <div className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(16rem,20rem)_minmax(0,1fr)] 2xl:grid-cols-[minmax(26rem,30rem)_minmax(0,1fr)]">
        <LiveGround control={form.control} run={run} sounding={sounding} />
        <div className="min-w-0 print:hidden">
          <InterpretationFields form={form} run={run} />
        </div>
        <div className="hidden min-w-0 flex-col gap-6 print:flex">
          <PrintedText control={form.control} run={run} />
        </div>
      </div>
      <FormErrors faults={theirs ? [] : formFaults(save.error, FIELD_LABELS)} />
      <div className="sticky bottom-0 flex flex-wrap items-center gap-3 border-t border-rule bg-paper py-3 print:hidden">
        <Button kind={isDirty ? 'main' : 'plain'} type="submit" disabled={!isDirty} loading={save.isPending}>
          Save changes
        </Button>
        <span className="text-sm text-muted">
          {isDirty ? 'Changes not saved yet' : 'Everything is saved'}
        </span>
      </div>
      {theirs ? (
        <ConflictDialog
          subject="This interpretation"
          fields={interpretationVersions({
            base: formOf(base),
            mine: form.getValues(),
            theirs: formOf(theirs),
          })}
          working={save.isPending}
          onClose={() => save.reset()}
          onResolve={(taken) =>
            send(mergedInterpretation(form.getValues(), formOf(theirs), taken), theirs.version)
          }
        />
      ) : null}
      <LeaveGuard isDirty={isDirty} />
    </form>
  );
}

interface LiveProps {
  control: ReturnType<typeof useForm<InterpretationForm>>['control'];
  run: Run;
  sounding: Sounding;
}

function LiveGround({ control, run, sounding }: LiveProps) {
  const [beds, waterLevel] = useWatch({ control, name: ['beds', 'waterLevelDepthM'] });
  return (
    <InterpretationGround
      run={run}
      sounding={sounding}
      grounds={beds.map((bed) => bed.ground.trim())}
      waterLevelDepthM={waterLevel !== null && Number.isFinite(waterLevel) ? waterLevel : null}
    />
  );
}

/** Inputs cut long words off on paper; what stands in them is printed as text. */
function PrintedText({ control, run }: Pick<LiveProps, 'control' | 'run'>) {
  const [beds, waterLevelDepthM, narrative] = useWatch({
    control,
    name: ['beds', 'waterLevelDepthM', 'narrative'],
  });
  return <InterpretationText content={{ beds, waterLevelDepthM, narrative }} run={run} />;
}

function NewerVersion({ isDirty, onTakeUp }: { isDirty: boolean; onTakeUp: () => void }) {
  return (
    <Notice
      tone="caution"
      title="Someone else saved a newer version"
      actions={
        isDirty ? null : (
          <Button size="small" onClick={onTakeUp}>
            Read the newer version
          </Button>
        )
      }
    >
      {isDirty
        ? 'What you wrote is still here. On saving you see both versions and choose.'
        : 'You see the one from before.'}
    </Notice>
  );
}

/** Leaving with unsaved words is asked about, inside the product and out of it. */
function LeaveGuard({ isDirty }: { isDirty: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      isDirty && nextLocation.state !== DISCARDED && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!isDirty) return undefined;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isDirty]);
  return (
    <ConfirmDialog
      open={blocker.state === 'blocked'}
      onOpenChange={(open) => !open && blocker.reset?.()}
      title="Leave without saving"
      description="Your changes to this interpretation are not saved; leaving gives them up."
      confirmLabel="Leave"
      danger
      onConfirm={() => blocker.proceed?.()}
    />
  );
}
