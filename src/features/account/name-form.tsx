import { useForm } from 'react-hook-form';
import { updateMeSchema } from '../../../server/contract/session';
import { formFaults } from '../../api/form-faults';
import { Button } from '../../ui/button';
import { Field } from '../../ui/field';
import { FormErrors } from '../../ui/form-errors';
import { formResolver } from '../../ui/form-resolver';
import { Input } from '../../ui/input';
import { showToast } from '../../ui/show-toast';
import { useUpdateMe } from './account-mutations';

export function NameForm({ name }: { name: string }) {
  const update = useUpdateMe();
  const form = useForm({ resolver: formResolver(updateMeSchema), values: { name } });
  const send = form.handleSubmit((values) =>
    update.mutate(values, { onSuccess: () => showToast({ title: 'Name saved', kind: 'good' }) }),
  );
  return (
    <form noValidate className="flex max-w-sm flex-col gap-3" onSubmit={(event) => void send(event)}>
      <FormErrors faults={formFaults(update.error, { name: 'Name' })} />
      <Field label="Name" error={form.formState.errors.name?.message}>
        <Input autoComplete="name" {...form.register('name')} />
      </Field>
      <Button type="submit" className="self-start" loading={update.isPending}>
        Save the name
      </Button>
    </form>
  );
}
