import { type QueryClient } from '@tanstack/react-query';
import { Link, redirect, useLocation, useNavigate, useSearchParams } from 'react-router-dom';
import { type Me } from '#contract/accounts';
import { Door } from '../features/account/door.tsx';
import { SignInForm } from '../features/account/sign-in-form.tsx';
import { paths } from '../lib/paths.ts';
import { sessionQuery } from '../lib/session.ts';
import { PageProblem } from './shell/page-problem.tsx';

/** Only a page of ours: a sign-in must not lead anybody elsewhere. */
const ownPage = (next: string | null): string | null => (next && /^\/(?![/\\])/u.test(next) ? next : null);

const homeOf = (me: Me) => (me.memberships.length > 0 ? paths.shelf() : paths.account());

export const loader =
  (client: QueryClient) =>
  async ({ request }: { request: Request }) => {
    const { person } = await client.query({ ...sessionQuery, staleTime: 0 });
    const next = ownPage(new URL(request.url).searchParams.get('next'));
    return person ? redirect(next ?? homeOf(person)) : null;
  };

export function Component() {
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const state = useLocation().state as { email?: string; note?: string } | null;
  const next = ownPage(search.get('next'));
  return (
    <Door
      lead={
        state?.note ?? (
          <>
            Film it once. Write it down right.
            <br />
            Every round counted three ways.
          </>
        )
      }
    >
      <h1 className="sr-only">Sign in</h1>
      <SignInForm email={state?.email ?? ''} onDone={(me) => void navigate(next ?? homeOf(me), { replace: true })} />
      <p className="mt-[15px] flex justify-between border-t border-rule pt-3.5">
        <Link to={paths.signUp('studio')} className="link">
          Open a studio
        </Link>
        <Link to={paths.signUp()} className="link">
          I only want to make something
        </Link>
      </p>
      <p className="mt-3">
        <a href={paths.count()} className="link">
          Count a written pattern, without signing in
        </a>
      </p>
    </Door>
  );
}

export const ErrorBoundary = () => <PageProblem />;
