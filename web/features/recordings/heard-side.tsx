import type { Recording } from '#contract/recordings';
import { PatternPrint } from '../../parts/pattern-print.tsx';
import { formatMoment } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { draftWords, pieceWords } from './draft-words.ts';

interface HeardSideProps {
  recording: Recording | undefined;
  mayEdit: boolean;
  isTaking: boolean;
  onTake: (readingId: string) => void;
}

/** What the reading made of the transcript: the pieces with their print, and how much of it agrees. */
export function HeardSide({ recording, mayEdit, isTaking, onTake }: HeardSideProps) {
  const summary = recording?.transcript?.reading.summary;
  const first = summary?.pieces[0];
  return (
    <section aria-labelledby="heard-heading" className="mt-auto border-t border-rule">
      <header className="panel-head bg-chalk">
        <h2 id="heard-heading" className="h-panel">
          Rounds heard so far
        </h2>
        {summary && <span className="small ml-auto text-walnut2">{summary.terms} terms</span>}
      </header>
      <div className="grid grid-cols-[158px_minmax(0,1fr)] gap-3 px-3.5 py-3">
        <PatternPrint
          size={152}
          of={first ? { form: first.worked === 'rows' ? 'rows' : 'rings', totals: first.totals } : null}
        />
        <div className="self-center text-walnut2">
          {summary ? (
            <>
              <ul>
                {summary.pieces.map((piece, index) => (
                  <li key={index}>{pieceWords(piece)}.</li>
                ))}
              </ul>
              <p className="mt-1.5 text-walnut">{draftWords(summary)}.</p>
            </>
          ) : (
            <p>Nothing yet. A transcript brings them, or you write them at the bench.</p>
          )}
        </div>
      </div>
      {summary?.notice && <p className="px-3.5 pb-3">{summary.notice}</p>}
      {summary && summary.unread.length > 0 && (
        <div className="px-3.5 pb-3">
          <p className="small text-walnut2">Not understood, and quoted at the bench:</p>
          {summary.unread.slice(0, 3).map(({ quote, atMs }) => (
            <p key={`${atMs}${quote}`} className="said">
              <span className="small mr-2 font-sans text-walnut3 not-italic">{formatMoment(atMs)}</span>
              <span className="tack">{quote}</span>
            </p>
          ))}
        </div>
      )}
      {summary && !summary.taken && summary.pieces.length > 0 && mayEdit && (
        <div className="suggestion mx-3.5 mb-3.5">
          <p className="mb-2">This reading is not in the pattern yet. What you have written stays as it is.</p>
          <Button size="row" onClick={() => onTake(summary.id)} {...(isTaking ? { notYet: 'It is being taken.' } : {})}>
            Take what is new
          </Button>
        </div>
      )}
    </section>
  );
}
