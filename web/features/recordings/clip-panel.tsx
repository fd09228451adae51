import type { Recording, RecordingList } from '#contract/recordings';
import { formatBytes } from '../../lib/time.ts';
import { ClipPicture } from './clip-still.tsx';
import { CLIP_ACCEPT, FileChoice } from './file-choice.tsx';
import { StoppedUpload } from './stopped-upload.tsx';
import { UploadProgress } from './upload-progress.tsx';
import { useUpload } from './upload/uploads.ts';
import { WholeClip } from './whole-clip.tsx';

interface ClipPanelProps {
  recording: Recording | undefined;
  room: RecordingList['storage'] | undefined;
  mayEdit: boolean;
  onFile: (file: File) => void;
  onRemoveClip: () => void;
  onLetGo: (uploadId: string) => void;
  onChanged: () => void;
}

function Room({ room }: { room: RecordingList['storage'] | undefined }) {
  if (!room) return null;
  const left = Math.max(0, room.quotaBytes - room.usedBytes);
  return (
    <>
      {' '}
      The studio has {formatBytes(left)} of {formatBytes(room.quotaBytes)} left.
    </>
  );
}

/** The clip of a recording: not yet there, on its way from this tab or another day, refused, or whole. */
export function ClipPanel({ recording, room, mayEdit, onFile, onRemoveClip, onLetGo, onChanged }: ClipPanelProps) {
  const here = useUpload(recording?.id);
  const clip = recording?.clip;
  const waiting = recording?.upload;
  const isUnderWay = here !== undefined && here.state.phase !== 'ready' && here.state.phase !== 'cancelled';
  return (
    <section
      aria-labelledby="clip-heading"
      className="grid grid-cols-[176px_minmax(0,1fr)] gap-x-5 gap-y-3 border-b border-feint px-6 py-4 max-sm:grid-cols-1 max-sm:px-4"
    >
      <ClipPicture url={clip?.url} />
      <div className="flex min-w-0 flex-col">
        <h2 id="clip-heading" className="sr-only">
          Clip
        </h2>
        {isUnderWay && <UploadProgress entry={here} onFile={onFile} onChanged={onChanged} />}
        {!isUnderWay && waiting && waiting.state !== 'ready' && (
          <StoppedUpload upload={waiting} mayEdit={mayEdit} onFile={onFile} onLetGo={onLetGo} />
        )}
        {!isUnderWay && !waiting && clip && (
          <WholeClip recording={recording} clip={clip} mayEdit={mayEdit} onFile={onFile} onRemove={onRemoveClip} />
        )}
        {!isUnderWay && !waiting && !clip && (
          <>
            <p className="h-piece">Clip</p>
            <p className="mt-1 mb-3 text-walnut2">
              {recording?.publicUrl ? 'It stands elsewhere; a clip here can be played beside the lines. ' : ''}
              MP4, WebM or MOV, up to 8 GB. You can leave the page while it goes up.
              <Room room={room} />
            </p>
            {mayEdit && (
              <span>
                <FileChoice accept={CLIP_ACCEPT} onFile={onFile}>
                  Choose a clip
                </FileChoice>
              </span>
            )}
          </>
        )}
      </div>
    </section>
  );
}
