import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { type Me } from '#contract/accounts';
import { InvitationJoin, type InvitationLook } from '#contract/studios';
import { useSignOut } from '../features/account/account.queries.ts';
import { Door } from '../features/account/door.tsx';
import { useFragmentToken } from '../features/account/fragment-token.ts';
import { SignInForm } from '../features/account/sign-in-form.tsx';
import { NewPersonFields } from '../features/account/sign-up-form.tsx';
import { invitationQuery, useJoin } from '../features/studio/studio.queries.ts';
import { paths } from '../lib/paths.ts';
import { sessionQuery } from '../lib/session.ts';
import { useContractForm, wordsOf } from '../lib/use-contract-form.ts';
import { Button } from '../ui/button.tsx';
import { LinkButton } from '../ui/link-button.tsx';
import { ErrorNote, LoadingRows } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';

/** For somebody who is signed in with the address the letter went to. */
function Accept({ token }: { token: string }) {
  const navigate = useNavigate();
  const { accept } = useJoin();
  const answer = useMutation({
    mutationFn: () => accept(token),
    onSuccess: () => navigate(paths.shelf(), { replace: true }),
  });
  return (
    <>
      {answer.error && <ErrorNote what="Not joined.">{wordsOf(answer.error)}</ErrorNote>}
      <Button kind="primary" size="tall" className="mt-3 w-full" onClick={() => answer.mutate()}>
        {answer.isPending ? 'Joining' : 'Join the studio'}
      </Button>
    </>
  );
}

/** For somebody who is signed in with another address. */
function OtherPerson({ me, email }: { me: Me; email: string }) {
  const signOut = useSignOut();
  return (
    <>
      <p className="text-walnut2">
        The letter went to {email}; you are signed in as {me.email}.
      </p>
      <Button className="mt-3" onClick={() => signOut.mutate()}>
        Sign out, then go on
      </Button>
    </>
  );
}

/** For somebody without an account: the letter has proved the address, so one form is enough. */
function Join({ token }: { token: string }) {
  const navigate = useNavigate();
  const form = useContractForm({
    schema: InvitationJoin,
    defaultValues: { token, name: '', password: '' },
    submit: useJoin().join,
    onDone: () => void navigate(paths.shelf(), { replace: true }),
  });
  return (
    <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="space-y-[15px]">
      {form.failure && <ErrorNote what="Not joined.">{form.failure}</ErrorNote>}
      <NewPersonFields register={form.register} errorAt={form.errorAt} typed={form.watch('password')} />
      <Button type="submit" kind="primary" size="tall" className="w-full">
        {form.isSending ? 'Joining' : 'Join the studio'}
      </Button>
    </form>
  );
}

function Answer({ token, look }: { token: string; look: InvitationLook }) {
  const session = useQuery(sessionQuery);
  const [, setMe] = useState<Me>();
  if (session.error) return <ErrorNote what="Who you are could not be asked.">{wordsOf(session.error)}</ErrorNote>;
  if (!session.data) return <LoadingRows rows={2} />;
  const me = session.data.person;
  if (!me) return look.isKnown ? <SignInForm email={look.email} onDone={setMe} /> : <Join token={token} />;
  return me.email.toLowerCase() === look.email.toLowerCase() ? (
    <Accept token={token} />
  ) : (
    <OtherPerson me={me} email={look.email} />
  );
}

export function Component() {
  const token = useFragmentToken();
  const { data: look, error } = useQuery(invitationQuery(token));
  const title = look ? `${look.askedBy} asks you into ${look.studioName}` : 'An invitation';
  const lead = look && `As ${look.role === 'creator' ? 'a' : 'an'} ${look.role}. ${look.email}`;
  return (
    <Door title={title} lead={lead}>
      {error && (
        <ErrorNote what="This invitation cannot be used." action={<LinkButton to={paths.signIn()}>Sign in</LinkButton>}>
          {wordsOf(error)}
        </ErrorNote>
      )}
      {!look && !error && <LoadingRows rows={3} />}
      {look && <Answer token={token} look={look} />}
    </Door>
  );
}

export const ErrorBoundary = () => <PageProblem />;
