import { type QueryClient, queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { type LoaderFunction, type LoaderFunctionArgs, redirect } from 'react-router-dom';
import { type Me, Session } from '#contract/accounts';
import { send } from './http.ts';
import { paths } from './paths.ts';

/** Who is signed in, or null. Asking is never an error. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => send(Session, '/api/session', { signal }),
});

/**
 * The loader of a page in the house: whoever is not signed in goes to the sign-in page, which comes back here.
 *
 * @param load fills the cache with what the page reads
 */
export const signedInLoader =
  (load?: (client: QueryClient, args: LoaderFunctionArgs, me: Me) => Promise<unknown>) =>
  (client: QueryClient): LoaderFunction =>
  async (args) => {
    const { person } = await client.query({ ...sessionQuery, staleTime: 'static' });
    if (!person) {
      const { pathname, search } = new URL(args.request.url);
      return redirect(paths.signIn(pathname + search));
    }
    await load?.(client, args, person);
    return null;
  };

/** The person who is signed in. Only under pages with a `signedInLoader`. */
export function useMe(): Me {
  const { person } = useSuspenseQuery(sessionQuery).data;
  if (!person) throw new Error('this page is for people who have signed in');
  return person;
}

const CHOSEN = 'roundelay.studio';
type Membership = Me['memberships'][number];

/** The studio somebody works in now: the one last chosen in this browser, else the first they joined, else null. */
export function studioOf(me: Me): Membership | null {
  const chosen = localStorage.getItem(CHOSEN);
  return me.memberships.find((m) => m.studioId === chosen) ?? me.memberships[0] ?? null;
}

/** Goes to work in another of one's studios, in this browser. */
export const chooseStudio = (studioId: string): void => localStorage.setItem(CHOSEN, studioId);
