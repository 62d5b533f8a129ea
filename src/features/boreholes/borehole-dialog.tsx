import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { boreholeSchema, writeBoreholeSchema, type Borehole } from '../../../server/contract/surveys';
import { currentOf, hasCode } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { ConflictDialog } from '../../ui/conflict-dialog';
import { Dialog } from '../../ui/dialog';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { showToast } from '../../ui/show-toast';
import { mergeRows, versionFields } from '../../ui/version-fields';
import { BoreholeFields, type BoreholeForm } from './borehole-fields';
import { useWriteBorehole } from './borehole-mutations';
import {
  BOREHOLE_LABELS,
  boreholeValues,
  EMPTY_BOREHOLE,
  showBoreholeField,
  type BoreholeValues,
} from './borehole-values';

interface BoreholeDialogProps {
  surveyId: string;
  /** null = a new one */
  borehole: Borehole | null;
  onClose: () => void;
}

interface Clash {
  base: Borehole;
  mine: BoreholeValues;
  theirs: Borehole;
}

export function BoreholeDialog({ surveyId, borehole, onClose }: BoreholeDialogProps) {
  const formId = useId();
  const [base, setBase] = useState(borehole);
  const [clash, setClash] = useState<Clash | null>(null);
  const write = useWriteBorehole(surveyId);
  const form: BoreholeForm = useForm({
    resolver: formResolver(writeBoreholeSchema),
    defaultValues: borehole ? boreholeValues(borehole) : { ...EMPTY_BOREHOLE, depthM: Number.NaN },
  });
  const save = (mine: BoreholeValues, from: Borehole | null) =>
    write.mutate(
      { boreholeId: from?.id ?? null, body: mine, version: from?.version ?? 0 },
      {
        onSuccess: ({ name }) => {
          showToast({ title: `Borehole ${name} saved`, kind: 'good' });
          onClose();
        },
        onError: (error) => {
          const theirs = currentOf(error, boreholeSchema);
          if (theirs && from) setClash({ base: from, mine, theirs });
        },
      },
    );
  const resolve = (takeTheirs: ReadonlySet<string>) => {
    if (!clash) return;
    const merged = mergeRows(clash.mine, boreholeValues(clash.theirs), takeTheirs);
    form.reset(merged);
    setBase(clash.theirs);
    setClash(null);
    save(merged, clash.theirs);
  };
  if (clash)
    return (
      <ConflictDialog
        subject={`Borehole ${clash.base.name}`}
        fields={versionFields(
          BOREHOLE_LABELS,
          { base: boreholeValues(clash.base), mine: clash.mine, theirs: boreholeValues(clash.theirs) },
          showBoreholeField,
        )}
        onResolve={resolve}
        onClose={() => setClash(null)}
      />
    );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={borehole ? `Borehole ${borehole.name}` : 'New borehole'}
      width="wide"
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form={formId} kind="main" loading={write.isPending}>
            Save the borehole
          </Button>
        </>
      }
    >
      <form
        id={formId}
        noValidate
        className="flex flex-col gap-5"
        onSubmit={(event) => void form.handleSubmit((values) => save(values, base))(event)}
      >
        <FormErrors
          faults={hasCode(write.error, 'conflict') ? [] : formFaults(write.error, BOREHOLE_LABELS)}
        />
        <BoreholeFields form={form} />
      </form>
    </Dialog>
  );
}
