import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { surveySchema, type Survey } from '../../../server/contract/surveys';
import { currentOf, hasCode } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { ConflictDialog } from '../../ui/conflict-dialog';
import { Dialog } from '../../ui/dialog';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { showToast } from '../../ui/show-toast';
import { mergeRows, versionFields } from '../../ui/version-fields';
import {
  SURVEY_LABELS,
  SurveyFields,
  surveyBody,
  surveyFormSchema,
  surveyValues,
  type SurveyFormValues,
} from './survey-fields';
import { useUpdateSurvey } from './survey-mutations';

interface Clash {
  mine: SurveyFormValues;
  theirs: Survey;
}

export function SurveySettingsDialog({ survey, onClose }: { survey: Survey; onClose: () => void }) {
  const formId = useId();
  const [base, setBase] = useState(survey);
  const [clash, setClash] = useState<Clash | null>(null);
  const update = useUpdateSurvey(survey.id);
  const form = useForm({ resolver: formResolver(surveyFormSchema), defaultValues: surveyValues(survey) });
  const save = (mine: SurveyFormValues, version: number) =>
    update.mutate(
      { body: surveyBody(mine), version },
      {
        onSuccess: () => {
          showToast({ title: 'Settings saved', kind: 'good' });
          onClose();
        },
        onError: (error) => {
          const theirs = currentOf(error, surveySchema);
          if (theirs) setClash({ mine, theirs });
        },
      },
    );
  const resolve = (takeTheirs: ReadonlySet<string>) => {
    if (!clash) return;
    const merged = mergeRows(clash.mine, surveyValues(clash.theirs), takeTheirs);
    form.reset(merged);
    setBase(clash.theirs);
    setClash(null);
    save(merged, clash.theirs.version);
  };
  if (clash)
    return (
      <ConflictDialog
        subject="This survey"
        fields={versionFields(SURVEY_LABELS, {
          base: surveyValues(base),
          mine: clash.mine,
          theirs: surveyValues(clash.theirs),
        })}
        onResolve={resolve}
        onClose={() => setClash(null)}
      />
    );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Survey settings"
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form={formId} kind="main" loading={update.isPending}>
            Save the settings
          </Button>
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
          faults={hasCode(update.error, 'conflict') ? [] : formFaults(update.error, SURVEY_LABELS)}
        />
        <SurveyFields form={form} />
      </form>
    </Dialog>
  );
}
