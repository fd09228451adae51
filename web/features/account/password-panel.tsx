import { useQueryClient } from '@tanstack/react-query';
import { PasswordChange } from '#contract/accounts';
import { useContractForm } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { changePassword, placesQuery } from './account.queries.ts';
import { PasswordField, PasswordLength } from './password-field.tsx';

const whatEnds = (others: number) =>
  others <= 0
    ? 'You are signed in nowhere else.'
    : others === 1
      ? 'Changing it signs out the other place.'
      : `Changing it signs out the other ${others} places.`;

/** A new password; `others` is how many other places are signed in. */
export function PasswordPanel({ others }: { others: number }) {
  const toast = useToast();
  const client = useQueryClient();
  const form = useContractForm({
    schema: PasswordChange,
    defaultValues: { current: '', password: '' },
    submit: changePassword,
    onDone: () => {
      form.reset();
      void client.invalidateQueries({ queryKey: placesQuery.queryKey });
      toast('Password changed.');
    },
  });
  return (
    <section className="px-6 py-5">
      <h2 className="h-panel mb-4">Password</h2>
      <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="space-y-4">
        {form.failure && <ErrorNote what="Not changed.">{form.failure}</ErrorNote>}
        <PasswordField
          label="Password now"
          autoComplete="current-password"
          error={form.errorAt('current')}
          {...form.register('current')}
        />
        <div>
          <PasswordField
            label="New password"
            autoComplete="new-password"
            error={form.errorAt('password')}
            {...form.register('password')}
          />
          <PasswordLength value={form.watch('password')} />
        </div>
        <Button type="submit" kind="primary">
          {form.isSending ? 'Changing' : 'Change password'}
        </Button>
        <p className="small text-walnut2">{whatEnds(others)}</p>
      </form>
    </section>
  );
}
