import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { nameSchema } from '../../../server/contract/common';
import {
  acceptInvitationSchema,
  passwordSchema,
  type invitationOfferSchema,
} from '../../../server/contract/session';
import { formFaults } from '../../api/form-faults';
import { addressOf } from '../../app/addresses';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { formatDay } from '../../ui/format';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { ROLE_NAMES } from '../../../server/contract/roles';
import { ROLE_NOTES } from '../../ui/role-words';
import { useAcceptInvitation } from './sign-in-mutations';

const newAccountSchema = z.strictObject({ name: nameSchema, password: passwordSchema });
const ownAccountSchema = acceptInvitationSchema.omit({ name: true });

interface InvitationFormProps {
  token: string;
  offer: z.output<typeof invitationOfferSchema>;
}

export function InvitationForm({ token, offer }: InvitationFormProps) {
  const navigate = useNavigate();
  const accept = useAcceptInvitation(token);
  const isNew = !offer.hasAccount;
  const form = useForm({
    resolver: formResolver<typeof newAccountSchema | typeof ownAccountSchema>(
      isNew ? newAccountSchema : ownAccountSchema,
    ),
    defaultValues: isNew ? { name: '', password: '' } : { password: '' },
  });
  const errors: Partial<Record<'name' | 'password', { message?: string }>> = form.formState.errors;
  const send = form.handleSubmit((values) =>
    accept.mutate(values, { onSuccess: () => void navigate(addressOf('surveys'), { replace: true }) }),
  );
  return (
    <form noValidate className="flex flex-col gap-4" onSubmit={(event) => void send(event)}>
      <div className="flex flex-col gap-2">
        <p>
          {offer.invitedBy} invites you to <b>{offer.surveyName}</b> as <b>{ROLE_NAMES[offer.role]}</b>.
        </p>
        <p className="text-muted">What this role does: {ROLE_NOTES[offer.role]}.</p>
        <p className="text-muted">
          For {offer.email}, open until {formatDay(offer.expiresAt)}.{' '}
          {isNew
            ? 'Choose a name and a password for your new account.'
            : 'You have an account: its own password is asked for.'}
        </p>
      </div>
      <FormErrors
        title="Not joined"
        faults={formFaults(accept.error, { name: 'Your name', password: 'Password' })}
      />
      {isNew ? (
        <Field label="Your name" hint="As colleagues will read it" error={errors.name?.message}>
          <Input autoComplete="name" {...form.register('name' as 'password')} />
        </Field>
      ) : null}
      <Field
        label="Password"
        hint={isNew ? 'At least 12 characters' : undefined}
        error={errors.password?.message}
      >
        <Input
          type="password"
          autoComplete={isNew ? 'new-password' : 'current-password'}
          {...form.register('password')}
        />
      </Field>
      <Button type="submit" kind="main" loading={accept.isPending}>
        Join the survey
      </Button>
    </form>
  );
}
