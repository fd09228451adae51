import { useState } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { type SignUp } from '#contract/accounts';
import { signUp } from '../features/account/account.queries.ts';
import { Door } from '../features/account/door.tsx';
import { SignUpForm } from '../features/account/sign-up-form.tsx';
import { paths } from '../lib/paths.ts';
import { wordsOf } from '../lib/use-contract-form.ts';
import { Button } from '../ui/button.tsx';
import { PageProblem } from './shell/page-problem.tsx';

/** After the form: where to look, and the letter again for those it does not reach. */
function LetterIsOut({ typed, onBack }: { typed: SignUp; onBack: () => void }) {
  const [said, setSaid] = useState('');
  const again = () =>
    signUp(typed).then(
      () => setSaid('The letter is out again.'),
      (error: unknown) => setSaid(wordsOf(error)),
    );
  return (
    <Door title="Confirm your address" lead="A letter with a link is on its way. Follow it, then sign in.">
      <p className="font-serif text-[16px] leading-[24px]">{typed.email}</p>
      <p className="small mt-1 text-walnut2">The link works once, for two days. Look among the unwanted mail too.</p>
      <div className="mt-5 flex gap-3">
        <Button onClick={() => void again()}>Send it again</Button>
        <Button kind="quiet" onClick={onBack}>
          Another address
        </Button>
      </div>
      <p role="status" className="mt-3 min-h-5 text-walnut2">
        {said}
      </p>
    </Door>
  );
}

export function Component() {
  const [search] = useSearchParams();
  const [typed, setTyped] = useState<SignUp>();
  const wantsStudio = search.get('for') === 'studio';
  if (typed) return <LetterIsOut typed={typed} onBack={() => setTyped(undefined)} />;
  return (
    <Door
      title={wantsStudio ? 'First an account, then the studio' : 'An account of your own'}
      lead={wantsStudio ? undefined : 'It keeps your place in what you make, on every device.'}
    >
      <SignUpForm onDone={setTyped} />
      <p className="mt-[15px] border-t border-rule pt-3.5">
        <Link to={paths.signIn(wantsStudio ? paths.openStudio() : undefined)} className="link">
          I have an account
        </Link>
      </p>
    </Door>
  );
}

export const ErrorBoundary = () => <PageProblem />;
