import { useForm } from 'react-hook-form';
import { Link, useParams } from 'react-router-dom';
import { resetPasswordSchema } from '../../../server/contract/session';
import { hasCode } from '../../api/api-error';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { Button, ButtonLink } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { Notice } from '../../ui/notice';
import { EntryFrame } from './entry-frame';
import { useResetPassword } from './sign-in-mutations';

export function ResetPasswordPage() {
  const { token = '' } = useParams();
  const reset = useResetPassword(token);
  const form = useForm({
    resolver: formResolver(resetPasswordSchema),
    defaultValues: { newPassword: '' },
  });
  if (reset.isSuccess)
    return (
      <EntryFrame title="New password">
        <Notice title="The password is set">Every session of this account has been signed out.</Notice>
        <ButtonLink kind="main" to={addressOf('signIn')} className="self-start">
          Sign in
        </ButtonLink>
      </EntryFrame>
    );
  const isSpent = hasCode(reset.error, 'not-found');
  return (
    <EntryFrame title="New password" note="Every session of this account is signed out when it is set.">
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => void form.handleSubmit((values) => reset.mutate(values))(event)}
      >
        <FormErrors faults={formFaults(reset.error, { newPassword: 'New password' })} />
        {isSpent ? <Link to={addressOf('forgotPassword')}>Ask for a new letter</Link> : null}
        <Field
          label="New password"
          hint="At least 12 characters"
          error={form.formState.errors.newPassword?.message}
        >
          <Input type="password" autoComplete="new-password" {...form.register('newPassword')} />
        </Field>
        <Button type="submit" kind="main" loading={reset.isPending}>
          Set the password
        </Button>
      </form>
    </EntryFrame>
  );
}
