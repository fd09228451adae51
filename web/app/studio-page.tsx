import { useSuspenseQuery } from '@tanstack/react-query';
import { UserPlus } from 'lucide-react';
import { useState } from 'react';
import { type Me } from '#contract/accounts';
import { InviteForm } from '../features/studio/invite-form.tsx';
import { PeopleLedger } from '../features/studio/people-ledger.tsx';
import { RightsTable } from '../features/studio/rights-table.tsx';
import { SettingsPanel } from '../features/studio/settings-panel.tsx';
import { peopleQuery, studioQuery } from '../features/studio/studio.queries.ts';
import { formatDay } from '../lib/days.ts';
import { paths } from '../lib/paths.ts';
import { signedInLoader, studioOf, useMe } from '../lib/session.ts';
import { Button } from '../ui/button.tsx';
import { LinkButton } from '../ui/link-button.tsx';
import { EmptyPaper } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader(async (client, _args, me) => {
  const studioId = studioOf(me)?.studioId;
  if (!studioId) return;
  const studio = client.query({ ...studioQuery(studioId), staleTime: 0 });
  const people = client.query({ ...peopleQuery(studioId), staleTime: 0 });
  await Promise.all([studio, people]);
});

function StudioDesk({ me, studioId }: { me: Me; studioId: string }) {
  const { data: studio } = useSuspenseQuery(studioQuery(studioId));
  const { data: people } = useSuspenseQuery(peopleQuery(studioId));
  const [isInviting, setInviting] = useState(false);
  const isOwner = studio.role === 'owner';
  return (
    <>
      <TopStrip title="Studio" beside={`${studio.name}, since ${formatDay(studio.createdAt)}`}>
        {isOwner && (
          <Button icon={UserPlus} aria-pressed={isInviting} onClick={() => setInviting(!isInviting)}>
            Invite
          </Button>
        )}
      </TopStrip>
      <main className="grid grow grid-cols-[minmax(0,1fr)_480px] max-lg:grid-cols-1">
        <div className="flex flex-col bg-sheet">
          <PeopleLedger studioId={studioId} people={people} me={me} isOwner={isOwner} />
          {isInviting && <InviteForm studioId={studioId} onClose={() => setInviting(false)} />}
          <div className="mt-auto pt-10">
            <RightsTable />
          </div>
        </div>
        <SettingsPanel key={studio.id} studio={studio} />
      </main>
    </>
  );
}

export function Component() {
  const me = useMe();
  const membership = studioOf(me);
  if (membership) return <StudioDesk me={me} studioId={membership.studioId} />;
  return (
    <>
      <TopStrip title="Studio" />
      <main className="flex grow flex-col *:grow">
        <EmptyPaper
          title="No studio yet"
          action={
            <LinkButton kind="primary" to={paths.openStudio()}>
              Open a studio
            </LinkButton>
          }
        >
          A studio holds patterns, recordings and the people who work on them. To make things from a pattern you need
          none.
        </EmptyPaper>
      </main>
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="studio" />;
