import { Winding } from '../../parts/thread/winding.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { CLIP_ACCEPT, FileChoice } from './file-choice.tsx';
import { progressOf } from './upload/upload-state.ts';
import { ofBytes, uploadWords } from './upload/upload-words.ts';
import { cancelUpload, forgetUpload, goOnWithUpload, pauseUpload, type UploadEntry } from './upload/uploads.ts';

interface UploadProgressProps {
  entry: UploadEntry;
  onFile: (file: File) => void;
  /** What the server keeps of it has changed. */
  onChanged: () => void;
}

/** A clip that this tab is sending, with what can be done about it. */
export function UploadProgress({ entry, onFile, onChanged }: UploadProgressProps) {
  const { recordingId, fileName, state } = entry;
  const { sentBytes, share } = progressOf(state);
  if (state.phase === 'refused') {
    return (
      <ErrorNote
        what={`${fileName} is not sent.`}
        action={
          <span className="flex flex-wrap gap-3">
            <FileChoice accept={CLIP_ACCEPT} onFile={onFile}>
              Choose another
            </FileChoice>
            <Button kind="quiet" onClick={() => goOnWithUpload(recordingId)}>
              Try again
            </Button>
            <Button kind="quiet" onClick={() => forgetUpload(recordingId)}>
              Put this away
            </Button>
          </span>
        }
      >
        {state.reason}
      </ErrorNote>
    );
  }
  const canStop = state.phase !== 'finishing';
  return (
    <>
      <p className="flex flex-wrap items-baseline gap-x-2.5">
        <span className="h-piece">Clip</span>
        <span className="min-w-0 truncate text-walnut2">{fileName}</span>
        <b className="ml-auto whitespace-nowrap">{ofBytes(sentBytes, state.size)}</b>
      </p>
      <div className="mt-2 mb-1.5">
        <Winding share={share} label={`${fileName}, as far as it is up`} />
      </div>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <p className="grow text-walnut2">
          {uploadWords(state)}
          {state.isResumed && state.phase === 'sending' && ' It went on where it had stopped.'}
        </p>
        {canStop && state.phase === 'paused' && (
          <Button kind="quiet" onClick={() => goOnWithUpload(recordingId)}>
            Go on
          </Button>
        )}
        {canStop && state.phase === 'waiting' && (
          <Button kind="quiet" onClick={() => goOnWithUpload(recordingId)}>
            Try now
          </Button>
        )}
        {canStop && state.phase !== 'paused' && (
          <Button kind="quiet" onClick={() => pauseUpload(recordingId)}>
            Pause
          </Button>
        )}
        {canStop && (
          <Button
            kind="quiet"
            onClick={() =>
              void cancelUpload(recordingId)
                .catch(() => undefined)
                .finally(onChanged)
            }
          >
            Cancel
          </Button>
        )}
      </div>
    </>
  );
}
