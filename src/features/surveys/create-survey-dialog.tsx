import { useId } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { SURVEY_LABELS, SurveyFields, surveyBody, surveyFormSchema } from './survey-fields';
import { useCreateSurvey } from './survey-mutations';

export function CreateSurveyDialog({ onClose }: { onClose: () => void }) {
  const formId = useId();
  const navigate = useNavigate();
  const create = useCreateSurvey();
  const form = useForm({
    resolver: formResolver(surveyFormSchema),
    defaultValues: { name: '', description: '', grid: '', epsgCode: null, errorFloorPercent: 3 },
  });
  const send = form.handleSubmit((values) =>
    create.mutate(surveyBody(values), {
      onSuccess: (survey) => void navigate(addressOf('survey', { surveyId: survey.id })),
    }),
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="New survey"
      description="You become its lead and can invite others."
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form={formId} kind="main" loading={create.isPending}>
            Create the survey
          </Button>
        </>
      }
    >
      <form id={formId} noValidate className="flex flex-col gap-4" onSubmit={(event) => void send(event)}>
        <FormErrors title="Not created" faults={formFaults(create.error, SURVEY_LABELS)} />
        <SurveyFields form={form} />
      </form>
    </Dialog>
  );
}
