import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { ReadingDifferences } from '#contract/readings';
import type { ReadingSummary, Recording } from '#contract/recordings';
import { paths } from '../../lib/paths.ts';
import { formatMoment } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { DraftPiece } from './draft-piece.tsx';
import { DraftSuggestions } from './draft-suggestions.tsx';
import { DraftTerms } from './draft-terms.tsx';
import { draftWords } from './draft-words.ts';
import { differencesQuery, useReadingDeeds } from './readings.queries.ts';

interface HeardSideProps {
  patternId: string;
  recording: Recording | undefined;
  mayEdit: boolean;
  isReading: boolean;
  onTerms: (terms: 'US' | 'UK') => void;
}

/** How many lines the reading has otherwise in pieces that the pattern has, or no longer at all. */
const otherwise = ({ pieces, gone, moments }: ReadingDifferences) =>
  pieces.reduce((sum, { piece, lines }) => sum + (piece ? lines.length : 0), gone.length + moments.length);

const notYetIn = ({ pieces }: ReadingDifferences) => pieces.filter(({ piece }) => piece === null).length;

/** What was not understood, word for word, with its moment. */
function Unread({ unread }: Pick<ReadingSummary, 'unread'>) {
  if (unread.length === 0) return null;
  return (
    <div className="border-b border-feint px-3.5 py-2">
      <p className="text-walnut2">Not understood, and quoted at the bench:</p>
      {unread.slice(0, 3).map(({ quote, atMs }) => (
        <p key={`${atMs}${quote}`} className="said">
          <span className="small mr-2 font-sans text-walnut3 not-italic">{formatMoment(atMs)}</span>
          <span className="tack">{quote}</span>
        </p>
      ))}
      {unread.length > 3 && <p className="small text-walnut2">and {unread.length - 3} more</p>}
    </div>
  );
}

/** Where the reading and the pattern are not the same: the way to look at it line by line. */
function ToCompare({ patternId, told }: { patternId: string; told: ReadingDifferences }) {
  const n = otherwise(told);
  if (n === 0) return null;
  return (
    <div className="suggestion mx-3.5 my-3">
      <p className="mb-1.5">
        <b>{n === 1 ? 'One place would read otherwise' : `${n} places would read otherwise`} than the pattern.</b>{' '}
        Nothing is changed until you take it.
      </p>
      <Link className="link" to={paths.reading(patternId, told.readingId)}>
        Look at what would change
      </Link>
    </div>
  );
}

/** The draft as a whole: in figures, its terms, each piece, what else was said; all of it to take, or piece by piece. */
function Draft({ patternId, summary, mayEdit, isReading, onTerms }: HeardSideProps & { summary: ReadingSummary }) {
  const { data: told, isError } = useQuery(differencesQuery(patternId, summary.id));
  const { take, leaveOut, undo } = useReadingDeeds(patternId);
  const toast = useToast();
  const isBusy = take.isPending || leaveOut.isPending || undo.isPending;
  const tellDone = (words: string) =>
    toast(
      words,
      () =>
        void undo.mutateAsync().then(
          () => toast('Undone'),
          () => toast('It could not be undone.'),
        ),
    );
  const takePieces = (name: string, pieces?: number[]) =>
    take.mutate(
      {
        readingId: summary.id,
        choice: { ...(pieces ? { pieces } : {}), ...(told && { lastChange: told.lastChange }) },
      },
      { onSuccess: () => tellDone(`${name} taken into the pattern`) },
    );
  const mayTake = mayEdit && told?.mayTake === true;
  return (
    <>
      <p className="border-b border-feint px-3.5 py-2 font-medium">{draftWords(summary)}.</p>
      <DraftTerms summary={summary} mayChange={mayEdit} isReading={isReading} onChange={onTerms} />
      {summary.notice !== null && (
        <p className="border-b border-feint px-3.5 py-2.5">
          {summary.notice}{' '}
          <Link className="link" to={paths.bench(patternId)}>
            Mark by hand at the bench
          </Link>
        </p>
      )}
      <ul aria-label="Pieces heard">
        {summary.pieces.map((piece, index) => (
          <DraftPiece
            key={index}
            patternId={patternId}
            piece={piece}
            difference={told?.pieces[index]}
            mayTake={mayTake}
            isBusy={isBusy}
            onTake={() => takePieces(piece.name, [index])}
            onLeaveOut={(row) =>
              leaveOut.mutate(row, { onSuccess: () => tellDone(`${piece.name} left out of the pattern`) })
            }
          />
        ))}
      </ul>
      {mayTake && notYetIn(told) > 1 && (
        <p className="border-b border-feint px-3.5 py-2.5">
          <Button
            kind="primary"
            onClick={() => takePieces('All pieces')}
            {...(isBusy ? { notYet: 'One moment.' } : {})}
          >
            Take all pieces
          </Button>
        </p>
      )}
      {(isError || take.isError || leaveOut.isError) && (
        <div className="px-3.5 py-2">
          <ErrorNote what={isError ? 'Not compared with the pattern.' : 'Not done.'}>
            Somebody else was quicker, or the connection was lost. Nothing is lost.
          </ErrorNote>
        </div>
      )}
      {told && <ToCompare patternId={patternId} told={told} />}
      <Unread unread={summary.unread} />
      <DraftSuggestions suggestions={summary.suggestions} />
    </>
  );
}

/** What the reading made of the transcript, and what of it the pattern has. */
export function HeardSide(props: HeardSideProps) {
  const summary = props.recording?.transcript?.reading.summary;
  return (
    <section aria-labelledby="heard-heading" className="border-b border-rule">
      <header className="panel-head bg-chalk">
        <h2 id="heard-heading" className="h-panel">
          What was heard
        </h2>
      </header>
      {summary ? (
        <Draft {...props} summary={summary} />
      ) : (
        <p className="px-3.5 py-3 text-walnut2">
          Nothing yet. A transcript brings the rounds, or you write them at the bench.
        </p>
      )}
    </section>
  );
}
