import { useState } from 'react';
import type { Recording } from '#contract/recordings';
import { formatBytes, formatMoment } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { CLIP_ACCEPT, FileChoice } from './file-choice.tsx';

/** A clip that is here whole. */
export function WholeClip(props: {
  recording: Recording;
  clip: NonNullable<Recording['clip']>;
  mayEdit: boolean;
  onFile: (file: File) => void;
  onRemove: () => void;
}) {
  const { recording, clip, mayEdit, onFile, onRemove } = props;
  const [isAsking, setAsking] = useState(false);
  const length = recording.durationMs === null ? '' : `${formatMoment(recording.durationMs)} long, `;
  return (
    <>
      <p className="flex flex-wrap items-baseline gap-x-2.5">
        <span className="h-piece">Clip</span>
        <span className="text-walnut2">{recording.title}</span>
        <b className="ml-auto">{formatBytes(clip.bytes)}</b>
      </p>
      <p className="mt-1 mb-3 text-walnut2">{length}here whole and ready to play.</p>
      {mayEdit && (
        <div className="flex flex-wrap items-center gap-3">
          <FileChoice accept={CLIP_ACCEPT} onFile={onFile}>
            Send a new cut
          </FileChoice>
          {isAsking ? (
            <>
              <Button kind="harm" onClick={onRemove}>
                Remove it for good
              </Button>
              <Button kind="quiet" onClick={() => setAsking(false)}>
                Keep it
              </Button>
            </>
          ) : (
            <Button kind="quiet" onClick={() => setAsking(true)}>
              Remove clip
            </Button>
          )}
        </div>
      )}
    </>
  );
}
