import { useId } from 'react';
import { useForm } from 'react-hook-form';
import { createInvitationSchema, type Survey } from '../../../server/contract/surveys';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { ROLE_OPTIONS } from '../../ui/role-words';
import { Select } from '../../ui/select';
import { showToast } from '../../ui/show-toast';
import { useInvite } from './member-mutations';

export function InviteDialog({ survey, onClose }: { survey: Survey; onClose: () => void }) {
  const formId = useId();
  const invite = useInvite(survey.id);
  const form = useForm({
    resolver: formResolver(createInvitationSchema),
    defaultValues: { email: '', role: 'geophysicist' as const },
  });
  const { errors } = form.formState;
  const send = form.handleSubmit((values) =>
    invite.mutate(values, {
      onSuccess: ({ email }) => {
        showToast({ title: `A letter is on its way to ${email}`, kind: 'good' });
        onClose();
      },
    }),
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Invite to ${survey.name}`}
      description="A letter with a link goes to the address; the link holds for 14 days."
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form={formId} kind="main" loading={invite.isPending}>
            Send the invitation
          </Button>
        </>
      }
    >
      <form id={formId} noValidate className="flex flex-col gap-4" onSubmit={(event) => void send(event)}>
        <FormErrors
          title="Not sent"
          faults={formFaults(invite.error, { email: 'E-mail address', role: 'Role' })}
        />
        <Field label="E-mail address" error={errors.email?.message}>
          <Input type="email" autoComplete="off" {...form.register('email')} />
        </Field>
        <Field label="Role" error={errors.role?.message}>
          <Select options={ROLE_OPTIONS} {...form.register('role')} />
        </Field>
      </form>
    </Dialog>
  );
}
