import type { Recording, TranscriptHead } from '#contract/recordings';
import { ProblemError } from '../../lib/http.ts';
import { formatMoment } from '../../lib/time.ts';
import { Waiting } from '../../parts/thread/winding.tsx';
import { VerdictMark } from '../../parts/verdict-mark.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { CorrectionsPanel } from './corrections-panel.tsx';
import { FileChoice, TRANSCRIPT_ACCEPT } from './file-choice.tsx';
import { ProblemList } from './problem-list.tsx';
import { mendedWords } from './problem-view.ts';

interface TranscriptPanelProps {
  recording: Recording | undefined;
  mayEdit: boolean;
  /** The last file was refused, or could not be sent. */
  refusal: { readonly fileName: string; readonly error: unknown } | null;
  isSending: boolean;
  chosen: number;
  onChoose: (index: number) => void;
  onFile: (file: File) => void;
  onReadAgain: (transcriptId: string) => void;
}

const EXAMPLE = `[0:42] Round one, six single crochet into the ring.

[1:04] Round two, increase in every stitch around.
That gives us twelve.`;

/** Where a transcript may come from, and what one without subtitles looks like. */
function None({ mayEdit, onFile }: Pick<TranscriptPanelProps, 'mayEdit' | 'onFile'>) {
  return (
    <div className="px-6 py-4 max-sm:px-4">
      <p className="mb-3 max-w-[68ch] text-walnut2">
        What was said, with its times: subtitles (.srt, .vtt), or text (.txt, .md) with a clock time before each
        paragraph. Up to 5 MB. The rounds are read from it; it is enough to begin with.
      </p>
      <pre className="said mb-4 max-w-[68ch] overflow-x-auto border-l border-rule bg-chalk px-4 py-2 whitespace-pre-wrap">
        {EXAMPLE}
      </pre>
      {mayEdit && (
        <FileChoice accept={TRANSCRIPT_ACCEPT} onFile={onFile}>
          Choose a transcript
        </FileChoice>
      )}
    </div>
  );
}

function Refusal({ fileName, error }: NonNullable<TranscriptPanelProps['refusal']>) {
  const isProblem = error instanceof ProblemError;
  return (
    <div className="border-b border-feint px-6 py-3 max-sm:px-4">
      <ErrorNote what={`${fileName} was not taken.`}>
        {isProblem ? (error.problem.detail ?? error.problem.title) : 'The connection was lost. Choose it again.'}
      </ErrorNote>
    </div>
  );
}

/** Whether the last caption lies within the clip: the two were made of the same recording. */
function Together({ recording, transcript }: { recording: Recording; transcript: TranscriptHead }) {
  const { durationMs } = recording;
  if (durationMs === null || transcript.lastMs === null || recording.clip === null) return null;
  const isWithin = transcript.lastMs <= durationMs + 2_000;
  return (
    <p className="grid grid-cols-[33px_88px_minmax(0,1fr)] border-b border-feint px-6 py-2 max-sm:grid-cols-[28px_minmax(0,1fr)] max-sm:px-4">
      <span className={isWithin ? 'text-moss' : ''}>
        <VerdictMark verdict={isWithin ? 'agrees' : 'differs'} />
      </span>
      <span className="max-sm:hidden">
        <b>{formatMoment(transcript.lastMs)}</b>
        <br />
        <span className="small text-walnut2">last caption</span>
      </span>
      <span>
        <b>{isWithin ? 'Clip and transcript belong together.' : 'The transcript goes on after the clip has ended.'}</b>
        <br />
        <span className="text-walnut2">
          The clip ends at {formatMoment(durationMs)}.{isWithin ? '' : ' Is it the transcript of another cut?'}
        </span>
      </span>
    </p>
  );
}

/** The transcript of a recording: what was read, what was odd about it by line, and how far the reading has come. */
export function TranscriptPanel(props: TranscriptPanelProps) {
  const { recording, mayEdit, refusal, isSending, chosen, onChoose, onFile, onReadAgain } = props;
  const transcript = recording?.transcript;
  return (
    <section aria-labelledby="transcript-heading" className="flex grow flex-col">
      <div className="border-b border-rule px-6 py-3 max-sm:px-4">
        <div className="flex flex-wrap items-baseline gap-x-2.5">
          <h2 id="transcript-heading" className="h-piece">
            Transcript
          </h2>
          {transcript && <span className="min-w-0 truncate text-walnut2">{transcript.fileName}</span>}
          {transcript && <b className="ml-auto">{transcript.captions} captions read</b>}
        </div>
        {transcript && <p className="mt-0.5">{mendedWords(transcript.problems)}</p>}
        {isSending && <Waiting label="The transcript is being sent" />}
      </div>
      {refusal && <Refusal {...refusal} />}
      {!transcript && <None mayEdit={mayEdit} onFile={onFile} />}
      {transcript?.reading.state === 'waiting' && (
        <p className="flex items-center gap-3 border-b border-feint px-6 py-3 text-walnut2">
          Reading the rounds <Waiting label="Reading the rounds" />
        </p>
      )}
      {transcript?.reading.state === 'failed' && (
        <div className="border-b border-feint px-6 py-3 max-sm:px-4">
          <ErrorNote
            what="The rounds could not be read."
            action={
              mayEdit && (
                <Button kind="quiet" onClick={() => onReadAgain(transcript.id)}>
                  Read it again
                </Button>
              )
            }
          >
            The transcript is kept. The fault is on our side.
          </ErrorNote>
        </div>
      )}
      {transcript && <ProblemList problems={transcript.problems} chosen={chosen} onChoose={onChoose} />}
      {recording && transcript && <Together recording={recording} transcript={transcript} />}
      {recording && transcript?.reading.state === 'done' && (
        <CorrectionsPanel key={transcript.reading.summary?.id} recording={recording} mayEdit={mayEdit} />
      )}
      {transcript && mayEdit && (
        <div className="mt-auto flex flex-wrap items-center gap-3 border-t border-rule px-6 py-2.5 max-sm:px-4">
          <p className="grow text-walnut2">Another? WebVTT, SubRip, or text with clock times, up to 5 MB.</p>
          <FileChoice accept={TRANSCRIPT_ACCEPT} onFile={onFile}>
            Swap file
          </FileChoice>
        </div>
      )}
    </section>
  );
}
