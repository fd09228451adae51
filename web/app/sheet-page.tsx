import { useParams } from 'react-router-dom';
import { PublishPanel } from '../features/editions/publish-panel.tsx';
import { patternQuery } from '../features/bench/data/bench.queries.ts';
import { useBench } from '../features/bench/data/use-bench.ts';
import { SheetForms } from '../features/sheet/sheet-forms.tsx';
import { SheetPreview } from '../features/sheet/sheet-preview.tsx';
import { signedInLoader } from '../lib/session.ts';
import { Button } from '../ui/button.tsx';
import { PageProblem } from './shell/page-problem.tsx';
import { PatternTabs, TopStrip } from './shell/top-strip.tsx';

export const loader = signedInLoader((client, { params }) =>
  client.query({ ...patternQuery(params.patternId ?? ''), staleTime: 0 }),
);

/** The sheet: what it says beside the lines, the real page as it prints, and the way out to an edition. */
export function Component() {
  const { patternId = '' } = useParams();
  return <SheetRoom key={patternId} patternId={patternId} />;
}

function SheetRoom({ patternId }: { patternId: string }) {
  const bench = useBench(patternId);
  const { pattern, save } = bench;
  const isSaved = save.state === 'saved';
  return (
    <>
      <TopStrip title={pattern.title} tabs={<PatternTabs patternId={patternId} />}>
        <span role="status" className={save.state === 'not-saved' ? 'text-madder' : 'text-walnut2'}>
          {save.words}
        </span>
        {save.state === 'not-saved' && <Button onClick={() => bench.retry()}>Try again</Button>}
      </TopStrip>
      <main className="grid grow grid-cols-[minmax(400px,5fr)_minmax(0,6fr)] max-lg:grid-cols-[minmax(0,1fr)]">
        <div className="border-r border-rule max-lg:order-2 max-lg:border-r-0">
          <PublishPanel patternId={patternId} code={pattern.code} version={pattern.lastChange} canAsk={isSaved} />
          <SheetForms desk={bench} />
        </div>
        <SheetPreview patternId={patternId} version={pattern.lastChange} paper="A4" terms={pattern.terms} />
      </main>
    </>
  );
}

export const ErrorBoundary = () => <PageProblem what="sheet" />;
