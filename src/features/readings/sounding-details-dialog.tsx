import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { soundingSchema, type Sounding } from '../../../server/contract/soundings';
import { currentOf, hasCode } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { SoundingFields } from '../../soundings/sounding-fields';
import {
  SOUNDING_LABELS,
  soundingFormSchema,
  soundingValues,
  type SoundingFormValues,
} from '../../soundings/sounding-form-schema';
import { useUpdateSounding } from '../../soundings/sounding-mutations';
import { Button } from '../../ui/button';
import { ConflictDialog } from '../../ui/conflict-dialog';
import { Dialog } from '../../ui/dialog';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { showToast } from '../../ui/show-toast';
import { mergeRows, versionFields } from '../../ui/version-fields';

interface Clash {
  mine: SoundingFormValues;
  theirs: Sounding;
}

interface SoundingDetailsDialogProps {
  sounding: Sounding;
  onClose: () => void;
}

export function SoundingDetailsDialog({ sounding, onClose }: SoundingDetailsDialogProps) {
  const formId = useId();
  const [base, setBase] = useState(sounding);
  const [clash, setClash] = useState<Clash | null>(null);
  const update = useUpdateSounding(sounding.id, sounding.surveyId);
  const form = useForm({
    resolver: formResolver(soundingFormSchema),
    defaultValues: soundingValues(sounding),
    disabled: !sounding.can.editSoundings,
  });
  const save = (mine: SoundingFormValues, version: number) =>
    update.mutate(
      { body: mine, version },
      {
        onSuccess: () => {
          showToast({ title: 'Details saved', kind: 'good' });
          onClose();
        },
        onError: (error) => {
          const theirs = currentOf(error, soundingSchema);
          if (theirs) setClash({ mine, theirs });
        },
      },
    );
  const resolve = (takeTheirs: ReadonlySet<string>) => {
    if (!clash) return;
    const merged = mergeRows(clash.mine, soundingValues(clash.theirs), takeTheirs);
    form.reset(merged);
    setBase(clash.theirs);
    setClash(null);
    save(merged, clash.theirs.version);
  };
  if (clash)
    return (
      <ConflictDialog
        subject={`Sounding ${sounding.name}`}
        fields={versionFields(SOUNDING_LABELS, {
          base: soundingValues(base),
          mine: clash.mine,
          theirs: soundingValues(clash.theirs),
        })}
        onResolve={resolve}
        onClose={() => setClash(null)}
      />
    );
  const mayEdit = sounding.can.editSoundings;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Details of ${sounding.name}`}
      actions={
        <>
          <Button onClick={onClose}>{mayEdit ? 'Cancel' : 'Close'}</Button>
          {mayEdit ? (
            <Button type="submit" form={formId} kind="main" loading={update.isPending}>
              Save the details
            </Button>
          ) : null}
        </>
      }
    >
      <form
        id={formId}
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => void form.handleSubmit((values) => save(values, base.version))(event)}
      >
        <FormErrors
          faults={hasCode(update.error, 'conflict') ? [] : formFaults(update.error, SOUNDING_LABELS)}
        />
        <SoundingFields
          form={form}
          surveyId={sounding.surveyId}
          {...(sounding.currentRevisionId === null
            ? {}
            : { spreadLocked: 'Readings are saved for this spread; another spread is another sounding.' })}
        />
      </form>
    </Dialog>
  );
}
