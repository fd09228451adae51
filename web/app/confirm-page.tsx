import { useMutation } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { confirmAddress } from '../features/account/account.queries.ts';
import { Door } from '../features/account/door.tsx';
import { useFragmentToken } from '../features/account/fragment-token.ts';
import { paths } from '../lib/paths.ts';
import { wordsOf } from '../lib/use-contract-form.ts';
import { Button } from '../ui/button.tsx';
import { ErrorNote } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';

/** Where the letter leads. Nothing is confirmed until somebody presses the button: mail readers follow links by themselves. */
export function Component() {
  const token = useFragmentToken();
  const navigate = useNavigate();
  const confirm = useMutation({
    mutationFn: () => confirmAddress(token),
    onSuccess: ({ email }) =>
      navigate(paths.signIn(), { replace: true, state: { email, note: 'Your address is confirmed. Sign in.' } }),
  });
  return (
    <Door title="Confirm your address" lead="One press, and the account is yours.">
      {confirm.error && (
        <div className="mb-4">
          <ErrorNote what="Not confirmed.">{wordsOf(confirm.error)}</ErrorNote>
        </div>
      )}
      <Button kind="primary" size="tall" className="w-full" onClick={() => confirm.mutate()}>
        {confirm.isPending ? 'Confirming' : 'Confirm this address'}
      </Button>
      <p className="mt-[15px] flex justify-between border-t border-rule pt-3.5">
        <Link to={paths.signIn()} className="link">
          Sign in
        </Link>
        <Link to={paths.signUp()} className="link">
          Ask for a new letter
        </Link>
      </p>
    </Door>
  );
}

export const ErrorBoundary = () => <PageProblem />;
