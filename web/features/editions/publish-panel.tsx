import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { PublishDesk } from '#contract/editions';
import { paths } from '../../lib/paths.ts';
import { VerdictMark } from '../../parts/verdict-mark.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNote, LoadingRows } from '../../ui/notes.tsx';
import { Switch } from '../../ui/switch.tsx';
import { useToast } from '../../ui/toast.tsx';
import { publishDeskQuery, usePublish } from './editions.queries.ts';
import { DraftedErrata, type Settled } from './drafted-errata.tsx';

const WHO = [
  { value: 'private', label: 'The studio alone' },
  { value: 'unlisted', label: 'With the link' },
  { value: 'listed', label: 'Everybody' },
] as const;

const SAYS: Readonly<Record<PublishDesk['visibility'], string>> = {
  private: 'Nobody outside the studio sees it; the page answers them as if there were none.',
  unlisted: 'Whoever has the address sees it. Search engines are asked to stay away.',
  listed: 'Whoever finds it sees it, search engines too.',
};

interface PublishPanelProps {
  patternId: string;
  /** Of its public address. */
  code: string;
  version: number;
  /** False while something of one's own is not saved yet: then the server would judge an older pattern. */
  canAsk: boolean;
}

/** What the next edition would be: who will see it, what holds it back line by line, what it changes, and the button. */
export function PublishPanel({ patternId, code, version, canAsk }: PublishPanelProps) {
  const desk = useQuery(publishDeskQuery(patternId, version));
  return (
    <section aria-labelledby="publish" className="border-b border-rule">
      <div className="panel-head">
        <h2 id="publish" className="h-panel">
          {desk.data ? `Publish edition ${desk.data.number}` : 'Publish'}
        </h2>
      </div>
      {desk.isPending && <LoadingRows rows={3} label="Looking what holds it back" />}
      {desk.isError && (
        <div className="p-3.5">
          <ErrorNote
            what="What holds it back could not be read."
            action={<Button onClick={() => void desk.refetch()}>Try again</Button>}
          >
            {desk.error.message}
          </ErrorNote>
        </div>
      )}
      {desk.data && (
        <Open key={desk.data.lastChange} patternId={patternId} code={code} desk={desk.data} canAsk={canAsk} />
      )}
    </section>
  );
}

function reasonNot(desk: PublishDesk, canAsk: boolean, visibility: PublishDesk['visibility']): string | undefined {
  if (!desk.mayPublish) return 'Only its creator or the owner of the studio publishes.';
  if (desk.lines === 0) return 'There is no line yet.';
  if (desk.blocks.length > 0)
    return desk.blocks.length === 1 ? '1 line holds it back' : `${desk.blocks.length} lines hold it back`;
  if (!canAsk) return 'Not everything is saved yet';
  const isSame = desk.number > 1 && desk.errata.length === 0 && visibility === desk.visibility;
  return isSame ? `Nothing changed since edition ${desk.number - 1}` : undefined;
}

function Open({ patternId, code, desk, canAsk }: Omit<PublishPanelProps, 'version'> & { desk: PublishDesk }) {
  const [visibility, setVisibility] = useState(
    desk.visibility === 'private' && desk.number === 1 ? 'unlisted' : desk.visibility,
  );
  const [settled, setSettled] = useState<Settled>(() =>
    desk.errata.map(({ weight }, index) => ({ index, told: weight !== 'look', why: '' })),
  );
  const publish = usePublish(patternId);
  const toast = useToast();
  const notYet = reasonNot(desk, canAsk, visibility);
  // A promise, not the call's own callback: the new number draws this form anew, and with it that callback is gone.
  const send = () =>
    void publish.mutateAsync({ lastChange: desk.lastChange, visibility, errata: [...settled] }).then(
      () => toast(`Edition ${desk.number} is out. Its sheets follow in a moment.`),
      () => undefined,
    );
  return (
    <div className="grid gap-3 p-3.5">
      <p className="text-walnut2">
        {desk.agreeing} of {desk.counted} rounds and rows agree.{' '}
        {desk.number > 1 && !desk.countsChanged && desk.errata.length > 0 && 'No count changed.'}
      </p>
      {desk.blocks.length > 0 && <Blocks patternId={patternId} desk={desk} />}
      {desk.unprintable.length > 0 && (
        <p className="suggestion">
          <b>The sheet cannot print {desk.unprintable.join(' ')}</b> None of its fonts has{' '}
          {desk.unprintable.length > 1 ? 'these signs' : 'this sign'}; they are left out. Write it in other words.
        </p>
      )}
      {desk.errata.length > 0 && <DraftedErrata desk={desk} settled={settled} onSettle={setSettled} />}
      <div>
        <span className="label">Who sees it</span>
        <div className="max-w-full overflow-x-auto p-0.5">
          <Switch label="Who sees it" value={visibility} options={WHO} onChange={setVisibility} />
        </div>
        <p className="small mt-1 text-walnut2">{SAYS[visibility]}</p>
      </div>
      {desk.number > 1 && desk.visibility !== 'private' && (
        <p>
          Edition {desk.number - 1} is out at{' '}
          <a className="link" href={`/w/${code}`}>{`${location.origin}/w/${code}`}</a>
        </p>
      )}
      {publish.isError && <ErrorNote what="It is not out.">{publish.error.message}</ErrorNote>}
      <div className="flex flex-wrap items-center gap-3">
        <Button kind="primary" notYet={notYet} disabled={publish.isPending} onClick={send}>
          {publish.isPending ? 'Publishing' : `Publish edition ${desk.number}`}
        </Button>
        {notYet !== undefined && <span className="text-walnut2">{notYet}</span>}
      </div>
    </div>
  );
}

function Blocks({ patternId, desk }: { patternId: string; desk: PublishDesk }) {
  return (
    <div>
      <h3 className="label">Before it can go</h3>
      <ul>
        {desk.blocks.map((block) => (
          <li key={block.lineId} className="flex items-center gap-2.5 border-b border-feint py-1.5">
            <VerdictMark verdict={block.verdict} />
            <span className="grow">{block.sentence}</span>
            <Link className="link" to={paths.bench(patternId, block.lineId)}>
              To the line
            </Link>
          </li>
        ))}
      </ul>
      <p className="small mt-1.5 text-walnut2">Mend each at the bench, or leave it as it is there and say why.</p>
    </div>
  );
}
