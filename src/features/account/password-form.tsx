import { useForm } from 'react-hook-form';
import { changePasswordSchema } from '../../../server/contract/session';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { showToast } from '../../ui/show-toast';
import { useChangePassword } from './account-mutations';

const EMPTY = { currentPassword: '', newPassword: '' };
const LABELS = { currentPassword: 'Current password', newPassword: 'New password' };

export function PasswordForm() {
  const change = useChangePassword();
  const form = useForm({ resolver: formResolver(changePasswordSchema), defaultValues: EMPTY });
  const { errors } = form.formState;
  const send = form.handleSubmit((values) =>
    change.mutate(values, {
      onSuccess: () => {
        form.reset(EMPTY);
        showToast({
          title: 'Password changed',
          description: 'The other sessions are signed out.',
          kind: 'good',
        });
      },
    }),
  );
  return (
    <form noValidate className="flex max-w-sm flex-col gap-3" onSubmit={(event) => void send(event)}>
      <FormErrors title="Not changed" faults={formFaults(change.error, LABELS)} />
      <Field label={LABELS.currentPassword} error={errors.currentPassword?.message}>
        <Input type="password" autoComplete="current-password" {...form.register('currentPassword')} />
      </Field>
      <Field label={LABELS.newPassword} hint="At least 12 characters" error={errors.newPassword?.message}>
        <Input type="password" autoComplete="new-password" {...form.register('newPassword')} />
      </Field>
      <Button type="submit" className="self-start" loading={change.isPending}>
        Change the password
      </Button>
    </form>
  );
}
