import { useId } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { SoundingFields } from '../../soundings/sounding-fields';
import { EMPTY_SOUNDING, SOUNDING_LABELS, soundingFormSchema } from '../../soundings/sounding-form-schema';
import { useCreateSounding } from '../../soundings/sounding-mutations';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';

interface NewSoundingDialogProps {
  surveyId: string;
  onClose: () => void;
}

export function NewSoundingDialog({ surveyId, onClose }: NewSoundingDialogProps) {
  const formId = useId();
  const navigate = useNavigate();
  const create = useCreateSounding(surveyId);
  const form = useForm({ resolver: formResolver(soundingFormSchema), defaultValues: EMPTY_SOUNDING });
  const send = form.handleSubmit((values) =>
    create.mutate(values, {
      onSuccess: (sounding) => void navigate(addressOf('readings', { soundingId: sounding.id })),
    }),
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="New sounding"
      description="Its Field sheet opens next. Everything but the name and the spread can wait."
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form={formId} kind="main" loading={create.isPending}>
            Create the sounding
          </Button>
        </>
      }
    >
      <form id={formId} noValidate className="flex flex-col gap-4" onSubmit={(event) => void send(event)}>
        <FormErrors title="Not created" faults={formFaults(create.error, SOUNDING_LABELS)} />
        <SoundingFields form={form} surveyId={surveyId} />
      </form>
    </Dialog>
  );
}
