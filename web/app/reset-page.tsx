import { Link, useNavigate } from 'react-router-dom';
import { PasswordReset } from '#contract/accounts';
import { resetPassword } from '../features/account/account.queries.ts';
import { Door } from '../features/account/door.tsx';
import { useFragmentToken } from '../features/account/fragment-token.ts';
import { PasswordField, PasswordLength } from '../features/account/password-field.tsx';
import { paths } from '../lib/paths.ts';
import { useContractForm } from '../lib/use-contract-form.ts';
import { Button } from '../ui/button.tsx';
import { ErrorNote } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';

export function Component() {
  const token = useFragmentToken();
  const navigate = useNavigate();
  const form = useContractForm({
    schema: PasswordReset,
    defaultValues: { token, password: '' },
    submit: resetPassword,
    onDone: () =>
      void navigate(paths.signIn(), { replace: true, state: { note: 'The new password holds. Sign in with it.' } }),
  });
  const failure = form.errorAt('token') ?? form.failure;
  return (
    <Door title="Choose a new password" lead="Everywhere you are signed in will then be signed out.">
      <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="space-y-[15px]">
        {failure && <ErrorNote what="Not changed.">{failure}</ErrorNote>}
        <div>
          <PasswordField
            label="New password"
            autoComplete="new-password"
            autoFocus
            tall
            error={form.errorAt('password')}
            {...form.register('password')}
          />
          <PasswordLength value={form.watch('password')} />
        </div>
        <Button type="submit" kind="primary" size="tall" className="w-full">
          {form.isSending ? 'Changing' : 'Change password'}
        </Button>
      </form>
      <p className="mt-[15px] border-t border-rule pt-3.5">
        <Link to={paths.forgotten()} className="link">
          Ask for a new letter
        </Link>
      </p>
    </Door>
  );
}

export const ErrorBoundary = () => <PageProblem />;
