import { Link } from 'react-router-dom';
import { type Me, SignIn } from '#contract/accounts';
import { paths } from '../../lib/paths.ts';
import { useContractForm } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useSignIn } from './account.queries.ts';
import { PasswordField } from './password-field.tsx';

/** Address and password. `email` fills the first where it is known already. */
export function SignInForm({ email = '', onDone }: { email?: string; onDone: (me: Me) => void }) {
  const form = useContractForm({
    schema: SignIn,
    defaultValues: { email, password: '' },
    submit: useSignIn(),
    onDone,
  });
  return (
    <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="space-y-[15px]">
      {form.failure && <ErrorNote what="Not signed in.">{form.failure}</ErrorNote>}
      <Field
        label="Email"
        type="email"
        autoComplete="username"
        autoFocus={email === ''}
        tall
        error={form.errorAt('email')}
        {...form.register('email')}
      />
      <PasswordField
        label="Password"
        autoComplete="current-password"
        autoFocus={email !== ''}
        tall
        error={form.errorAt('password')}
        aside={
          <Link to={paths.forgotten()} className="link small">
            Forgotten?
          </Link>
        }
        {...form.register('password')}
      />
      <Button type="submit" kind="primary" size="tall" className="w-full">
        {form.isSending ? 'Signing in' : 'Sign in'}
      </Button>
    </form>
  );
}
