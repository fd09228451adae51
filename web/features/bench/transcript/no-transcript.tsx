import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { Button } from '../../../ui/button.tsx';
import { ErrorNote, LoadingRows } from '../../../ui/notes.tsx';
import { type Cues } from '../cues.queries.ts';
import { useDesk } from '../desk/use-desk.ts';

/** No words here: on their way, not to be had, or none yet; and that lines can be written all the same. */
export function NoTranscript({ cues }: { cues: Cues }) {
  const { pattern, recordingId } = useDesk();
  const recording = pattern.recordings.find((one) => one.id === recordingId);
  if (recording?.transcriptId && cues.isLoading) return <LoadingRows rows={12} label="The transcript is on its way" />;
  if (recording?.transcriptId && cues.hasFailed) {
    return (
      <div className="p-3.5">
        <ErrorNote what="The transcript did not come." action={<Button onClick={cues.retry}>Try again</Button>}>
          It is kept on the server.
        </ErrorNote>
      </div>
    );
  }
  return (
    <div className="grow bg-sheet px-3.5 pt-3">
      <p className="font-serif text-[16px] leading-[24px]">
        {recording ? 'This recording has no transcript yet.' : 'No recording yet.'}
      </p>
      <p className="small mt-1.5 text-walnut2">
        Most film editors export WebVTT or SubRip. Text with clock times will do. Lines can be written without.
      </p>
      {pattern.mayEdit && (
        <Link to={paths.recording(pattern.id)} className="link mt-3 inline-block">
          Add {recording ? 'its transcript' : 'a recording'}
        </Link>
      )}
    </div>
  );
}
