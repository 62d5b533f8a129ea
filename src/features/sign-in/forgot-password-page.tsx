import { useForm } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { requestPasswordResetSchema } from '../../../server/contract/session';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { Notice } from '../../ui/notice';
import { EntryFrame } from './entry-frame';
import { useRequestPasswordReset } from './sign-in-mutations';

export function ForgotPasswordPage() {
  const request = useRequestPasswordReset();
  const form = useForm({
    resolver: formResolver(requestPasswordResetSchema),
    defaultValues: { email: '' },
  });
  return (
    <EntryFrame
      title="Forgotten password"
      note="A letter with a link to set a new password goes to your address. The link holds for one hour."
    >
      {request.isSuccess ? (
        <Notice title="Look into your mail">
          If an account has this address, a letter is on its way. Where none comes, check the address or ask
          your administrator.
        </Notice>
      ) : (
        <form
          noValidate
          className="flex flex-col gap-4"
          onSubmit={(event) => void form.handleSubmit((values) => request.mutate(values))(event)}
        >
          <FormErrors title="Not sent" faults={formFaults(request.error)} />
          <Field label="E-mail address" error={form.formState.errors.email?.message}>
            <Input type="email" autoComplete="username" {...form.register('email')} />
          </Field>
          <Button type="submit" kind="main" loading={request.isPending}>
            Send the letter
          </Button>
        </form>
      )}
      <p>
        <Link to={addressOf('signIn')}>Back to sign in</Link>
      </p>
    </EntryFrame>
  );
}
