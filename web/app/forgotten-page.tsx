import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Forgotten } from '#contract/accounts';
import { askForReset } from '../features/account/account.queries.ts';
import { Door } from '../features/account/door.tsx';
import { paths } from '../lib/paths.ts';
import { useContractForm } from '../lib/use-contract-form.ts';
import { Button } from '../ui/button.tsx';
import { Field } from '../ui/field.tsx';
import { ErrorNote } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';

function ForgottenForm({ onDone }: { onDone: (email: string) => void }) {
  const form = useContractForm({
    schema: Forgotten,
    defaultValues: { email: '' },
    submit: askForReset,
    onDone: (_sent, { email }) => onDone(email),
  });
  return (
    <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="space-y-[15px]">
      {form.failure && <ErrorNote what="Not sent.">{form.failure}</ErrorNote>}
      <Field
        label="Email"
        type="email"
        autoComplete="username"
        autoFocus
        tall
        error={form.errorAt('email')}
        {...form.register('email')}
      />
      <Button type="submit" kind="primary" size="tall" className="w-full">
        {form.isSending ? 'Sending the letter' : 'Send the letter'}
      </Button>
    </form>
  );
}

export function Component() {
  const [sentTo, setSentTo] = useState<string>();
  return (
    <Door
      title={sentTo ? 'Look into your mail' : 'A new password'}
      lead={
        sentTo
          ? 'If there is an account with this address, a letter with a link is on its way.'
          : 'A letter brings you a link to choose one.'
      }
    >
      {sentTo ? (
        <div role="status">
          <p className="font-serif text-[16px] leading-[24px]">{sentTo}</p>
          <p className="small mt-1 text-walnut2">The link works once, for an hour.</p>
          <Button className="mt-4" onClick={() => setSentTo(undefined)}>
            Another address
          </Button>
        </div>
      ) : (
        <ForgottenForm onDone={setSentTo} />
      )}
      <p className="mt-[15px] border-t border-rule pt-3.5">
        <Link to={paths.signIn()} className="link">
          Sign in
        </Link>
      </p>
    </Door>
  );
}

export const ErrorBoundary = () => <PageProblem />;
