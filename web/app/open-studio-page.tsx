import { useNavigate } from 'react-router-dom';
import { StudioCreate } from '#contract/studios';
import { useOpenStudio } from '../features/studio/studio.queries.ts';
import { paths } from '../lib/paths.ts';
import { signedInLoader } from '../lib/session.ts';
import { useContractForm } from '../lib/use-contract-form.ts';
import { Button } from '../ui/button.tsx';
import { Field } from '../ui/field.tsx';
import { EmptyPaper, ErrorNote } from '../ui/notes.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader();

export function Component() {
  const navigate = useNavigate();
  const form = useContractForm({
    schema: StudioCreate,
    defaultValues: { name: '' },
    submit: useOpenStudio(),
    onDone: () => void navigate(paths.shelf()),
  });
  return (
    <>
      <TopStrip title="Studio" beside="a new one" />
      <main className="flex grow flex-col *:grow">
        <EmptyPaper title="Open a studio">
          <p>
            It holds your patterns and recordings. You are its owner, and can ask others in, as creators or editors.
          </p>
          <form
            onSubmit={(event) => void form.onSubmit(event)}
            noValidate
            className="mt-6 max-w-[340px] space-y-4 font-sans text-walnut"
          >
            {form.failure && <ErrorNote what="Not opened.">{form.failure}</ErrorNote>}
            <Field
              label="Its name, as it stands on sheets"
              autoFocus
              tall
              error={form.errorAt('name')}
              {...form.register('name')}
            />
            <Button type="submit" kind="primary" size="tall">
              {form.isSending ? 'Opening' : 'Open the studio'}
            </Button>
          </form>
        </EmptyPaper>
      </main>
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="studio" />;
