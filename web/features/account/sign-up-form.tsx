import { type Path, type UseFormRegister } from 'react-hook-form';
import { SignUp } from '#contract/accounts';
import { useContractForm } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { signUp } from './account.queries.ts';
import { PasswordField, PasswordLength } from './password-field.tsx';

interface NewPerson {
  name: string;
  password: string;
}

/** Name and new password: what an account needs wherever it begins. */
export function NewPersonFields<T extends NewPerson>(props: {
  register: UseFormRegister<T>;
  errorAt: (name: Path<T>) => string | undefined;
  typed: string;
}) {
  const name = 'name' as Path<T>;
  const password = 'password' as Path<T>;
  return (
    <>
      <Field
        label="Name, as others see it"
        autoComplete="name"
        tall
        error={props.errorAt(name)}
        {...props.register(name)}
      />
      <div>
        <PasswordField
          label="Password"
          autoComplete="new-password"
          tall
          error={props.errorAt(password)}
          {...props.register(password)}
        />
        <PasswordLength value={props.typed} />
      </div>
    </>
  );
}

/** Asks for an account. `onDone` gets what was typed, so that the letter can be sent again. */
export function SignUpForm({ onDone }: { onDone: (typed: SignUp) => void }) {
  const form = useContractForm({
    schema: SignUp,
    defaultValues: { name: '', email: '', password: '' },
    submit: signUp,
    onDone: (_sent, typed) => onDone(typed),
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
      <NewPersonFields register={form.register} errorAt={form.errorAt} typed={form.watch('password')} />
      <Button type="submit" kind="primary" size="tall" className="w-full">
        {form.isSending ? 'Sending the letter' : 'Send the letter'}
      </Button>
    </form>
  );
}
