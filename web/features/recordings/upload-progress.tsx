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
      <div className="flex items-center gap-x-3 max-sm:flex-wrap">
        <p className="min-w-0 grow text-walnut2">
          {uploadWords(state)}
          {state.isResumed && state.phase === 'sending' && ' It went on where it had stopped.'}
        </p>
        {canStop && <Stops entry={entry} onChanged={onChanged} />}
      </div>
    </>
  );
}

function Stops({ entry, onChanged }: Omit<UploadProgressProps, 'onFile'>) {
  const { recordingId, state } = entry;
  const isStill = state.phase === 'paused';
  return (
    <span className="-mr-1.5 flex shrink-0 gap-1">
      {(isStill || state.phase === 'waiting') && (
        <Button kind="quiet" onClick={() => goOnWithUpload(recordingId)}>
          {isStill ? 'Go on' : 'Try now'}
        </Button>
      )}
      {!isStill && (
        <Button kind="quiet" onClick={() => pauseUpload(recordingId)}>
          Pause
        </Button>
      )}
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
    </span>
  );
}
