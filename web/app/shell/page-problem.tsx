import { isRouteErrorResponse, useLocation, useRevalidator, useRouteError } from 'react-router-dom';
import { ProblemError, UnreachableError } from '../../lib/http.ts';
import { paths } from '../../lib/paths.ts';
import { Button } from '../../ui/button.tsx';
import { LinkButton } from '../../ui/link-button.tsx';

const statusOf = (error: unknown): number => {
  if (error instanceof ProblemError) return error.problem.status;
  if (error instanceof UnreachableError) return 0;
  return isRouteErrorResponse(error) ? error.status : 500;
};

/** `what` names the thing: "pattern", "sheet". A thing that is not there and one that is not shared say the same. */
function wordsFor(status: number, what: string): { title: string; text: string } {
  if (status === 0)
    return {
      title: 'The server does not answer',
      text: 'What was saved is safe there. Look at the connection, then try again.',
    };
  if (status === 401) return { title: 'You are signed out', text: 'Sign in and you come back to this page.' };
  if (status === 403)
    return {
      title: 'This is not open to you',
      text: `Your part in the studio does not reach this ${what}. Its owner can change that.`,
    };
  if (status === 404)
    return {
      title: `There is no such ${what}`,
      text: 'Or it is not shared with you. Look on the shelf, or ask who sent you here.',
    };
  if (status === 429) return { title: 'Too many at once', text: 'Wait a minute, then try again.' };
  return { title: `This ${what} could not be shown`, text: 'The fault is on our side. What was saved is safe.' };
}

/** A page's ErrorBoundary: what is so, what is kept, one way on. `export const ErrorBoundary = () => <PageProblem what="sheet" />`. */
export function PageProblem({ what = 'page' }: { what?: string }) {
  const error = useRouteError();
  const { pathname, search } = useLocation();
  const { revalidate } = useRevalidator();
  const status = statusOf(error);
  const { title, text } = wordsFor(status, what);
  const canRetry = status === 0 || status === 429 || status >= 500;
  const reference = error instanceof ProblemError ? error.problem.instance : undefined;
  return (
    <main className="ruled-paper grow px-6 py-12">
      <div role="alert" className="error-box max-w-[640px] p-5!">
        <h1 className="font-serif text-[28px] leading-[40px] font-semibold">{title}</h1>
        <p className="mt-1 mb-4 max-w-[68ch] font-serif text-[16px] leading-[24px]">{text}</p>
        {status === 401 && (
          <LinkButton kind="primary" to={paths.signIn(pathname + search)}>
            Sign in
          </LinkButton>
        )}
        {canRetry && (
          <Button kind="primary" onClick={() => void revalidate()}>
            Try again
          </Button>
        )}
        {!canRetry && status !== 401 && (
          <LinkButton kind="primary" to={paths.shelf()}>
            To the shelf
          </LinkButton>
        )}
        {canRetry && reference && (
          <p className="small mt-3 text-walnut2">
            If it stays so, tell us this: {reference.replace('urn:request:', '')}
          </p>
        )}
      </div>
    </main>
  );
}
