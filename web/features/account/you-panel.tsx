import { Check } from 'lucide-react';
import { AccountEdit, type Me } from '#contract/accounts';
import { formatDay } from '../../lib/days.ts';
import { useContractForm } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { Icon } from '../../ui/icon.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { useRename } from './account.queries.ts';

/** The name others see, and the address. */
export function YouPanel({ me }: { me: Me }) {
  const toast = useToast();
  const form = useContractForm({
    schema: AccountEdit,
    defaultValues: { name: me.name },
    submit: useRename(me),
    onDone: ({ name }) => {
      form.reset({ name });
      toast('Name saved.');
    },
  });
  return (
    <section className="border-b border-rule px-6 py-5">
      <h2 className="h-panel mb-4">You</h2>
      <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="space-y-3">
        {form.failure && <ErrorNote what="Not saved.">{form.failure}</ErrorNote>}
        <Field
          label="Name, as others see it"
          autoComplete="name"
          error={form.errorAt('name')}
          {...form.register('name')}
        />
        {form.formState.isDirty && <Button type="submit">{form.isSending ? 'Saving' : 'Save the name'}</Button>}
      </form>
      <p className="label mt-4">Email</p>
      <p className="font-serif text-[16px] leading-[24px]">{me.email}</p>
      {me.emailConfirmedAt && (
        <p className="small mt-1 flex items-center gap-2 text-walnut2">
          <span className="text-moss">
            <Icon of={Check} size={16} />
          </span>
          confirmed {formatDay(me.emailConfirmedAt)}
        </p>
      )}
    </section>
  );
}
