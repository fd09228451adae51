import { Role } from '#contract/accounts';
import { InvitationCreate } from '#contract/studios';
import { useContractForm } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { Switch } from '../../ui/switch.tsx';
import { useToast } from '../../ui/toast.tsx';
import { useInvite } from './studio.queries.ts';

const MEANS: Readonly<Record<Role, string>> = {
  owner: 'An owner does everything, and says who belongs to the studio.',
  creator: 'A creator uploads, marks, writes lines and publishes.',
  editor: 'An editor sees every pattern here and mends lines, and publishes none.',
};

/** An invitation as the open line of the ledger. */
export function InviteForm({ studioId, onClose }: { studioId: string; onClose: () => void }) {
  const toast = useToast();
  const form = useContractForm({
    schema: InvitationCreate,
    defaultValues: { email: '', role: 'editor' },
    submit: useInvite(studioId),
    onDone: ({ email }) => {
      toast(`The letter to ${email} is out.`);
      onClose();
    },
  });
  const role = form.watch('role');
  return (
    <form
      onSubmit={(event) => void form.onSubmit(event)}
      noValidate
      aria-label="Invite"
      className="bar border-y-[1.5px] border-woad bg-sheet px-5 py-3.5"
    >
      {form.failure && <ErrorNote what="Not sent.">{form.failure}</ErrorNote>}
      <div className="flex flex-wrap items-start gap-x-5 gap-y-3">
        <div className="w-[300px] max-sm:w-full">
          <Field label="Email" type="email" autoFocus error={form.errorAt('email')} {...form.register('email')} />
        </div>
        <div>
          <span className="label">Role</span>
          <Switch
            label="Role"
            value={role}
            options={Role.options.map((value) => ({ value, label: value }))}
            onChange={(value) => form.setValue('role', value)}
          />
        </div>
        <div className="ml-auto flex gap-3 pt-[22px] max-sm:pt-0">
          <Button onClick={onClose}>Not now</Button>
          <Button type="submit" kind="primary">
            {form.isSending ? 'Sending' : 'Send the letter'}
          </Button>
        </div>
      </div>
      <p className="small mt-2 text-walnut2">{MEANS[Role.parse(role)]} The link works once, for seven days.</p>
    </form>
  );
}
