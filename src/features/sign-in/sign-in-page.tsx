import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { signInSchema } from '../../../server/contract/session';
import { formFaults } from '../../api/form-faults';
import { returnAddress } from '../../api/return-address';
import { meQuery } from '../../api/session-queries';
import { addressOf } from '../../app/addresses';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { Notice } from '../../ui/notice';
import { EntryFrame } from './entry-frame';
import { useSignIn } from './sign-in-mutations';

export function SignInPage() {
  const [search] = useSearchParams();
  const next = search.get('next');
  const me = useQuery(meQuery);
  const signIn = useSignIn();
  const form = useForm({
    resolver: formResolver(signInSchema),
    defaultValues: { email: '', password: '' },
  });
  const { errors } = form.formState;
  if (me.data) return <Navigate to={returnAddress(next)} replace />;
  return (
    <EntryFrame title="Sign in" note="From a field sheet to a decision on the ground.">
      {next === null ? null : (
        <Notice>Sign in to go on where you were. What you wrote on a Field sheet is kept.</Notice>
      )}
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => void form.handleSubmit((values) => signIn.mutate(values))(event)}
      >
        <FormErrors title="Not signed in" faults={formFaults(signIn.error)} />
        <Field label="E-mail address" error={errors.email?.message}>
          <Input type="email" autoComplete="username" {...form.register('email')} />
        </Field>
        <Field label="Password" error={errors.password?.message}>
          <Input type="password" autoComplete="current-password" {...form.register('password')} />
        </Field>
        <Button type="submit" kind="main" loading={signIn.isPending}>
          Sign in
        </Button>
        <p>
          <Link to={addressOf('forgotPassword')}>Forgot the password?</Link>
        </p>
      </form>
    </EntryFrame>
  );
}
