import { useSuspenseQuery } from '@tanstack/react-query';
import { placesQuery, useSignOut } from '../features/account/account.queries.ts';
import { PasswordPanel } from '../features/account/password-panel.tsx';
import { PlacesPanel } from '../features/account/places-panel.tsx';
import { StudiosPanel } from '../features/account/studios-panel.tsx';
import { YouPanel } from '../features/account/you-panel.tsx';
import { paths } from '../lib/paths.ts';
import { signedInLoader, useMe } from '../lib/session.ts';
import { Button } from '../ui/button.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader((client) => client.query({ ...placesQuery, staleTime: 0 }));

export function Component() {
  const me = useMe();
  const { data: places } = useSuspenseQuery(placesQuery);
  const signOut = useSignOut(paths.signIn());
  return (
    <>
      <TopStrip title="Account" beside={me.name}>
        <Button kind="quiet" onClick={() => signOut.mutate()}>
          Sign out here
        </Button>
      </TopStrip>
      <main className="grid grow grid-cols-[370px_minmax(0,1fr)] max-lg:grid-cols-1">
        <div className="border-r border-rule max-lg:border-r-0 max-lg:border-b">
          <YouPanel me={me} />
          <PasswordPanel others={places.length - 1} />
        </div>
        <div className="bg-sheet">
          <StudiosPanel memberships={me.memberships} />
          <PlacesPanel places={places} />
        </div>
      </main>
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="account" />;
