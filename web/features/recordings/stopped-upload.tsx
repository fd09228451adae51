import { useState } from 'react';
import type { Recording } from '#contract/recordings';
import { Winding } from '../../parts/thread/winding.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { CLIP_ACCEPT, FileChoice } from './file-choice.tsx';
import { ofBytes } from './upload/upload-words.ts';

type ServerUpload = NonNullable<Recording['upload']>;

/** A clip that arrived in part on another day, is being looked at, or was refused by the server. */
export function StoppedUpload(props: {
  upload: ServerUpload;
  mayEdit: boolean;
  onFile: (file: File) => void;
  onLetGo: (uploadId: string) => void;
}) {
  const { upload, mayEdit, onFile, onLetGo } = props;
  const [other, setOther] = useState<File | null>(null);
  const choose = (file: File) => {
    if (file.name === upload.name && file.size === upload.size) onFile(file);
    else setOther(file);
  };
  if (upload.state === 'refused') {
    return (
      <ErrorNote
        what={`${upload.name} was not taken.`}
        action={
          mayEdit && (
            <span className="flex gap-3">
              <FileChoice accept={CLIP_ACCEPT} onFile={onFile}>
                Choose another
              </FileChoice>
              <Button kind="quiet" onClick={() => onLetGo(upload.id)}>
                Put this away
              </Button>
            </span>
          )
        }
      >
        {upload.refusal}
      </ErrorNote>
    );
  }
  const share = upload.haveBytes / upload.size;
  return (
    <>
      <p className="flex flex-wrap items-baseline gap-x-2.5">
        <span className="h-piece">Clip</span>
        <span className="min-w-0 truncate text-walnut2">{upload.name}</span>
        <b className="ml-auto">{ofBytes(upload.haveBytes, upload.size)}</b>
      </p>
      <div className="my-2">
        <Winding share={share} label={`${upload.name}, as far as it has arrived`} />
      </div>
      {upload.state === 'completing' ? (
        <p className="text-walnut2">All of it has arrived. It is being looked at.</p>
      ) : (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <p className="grow text-walnut2">
            Not going on at the moment; {Math.floor(share * 100)}% is kept. Choose the same file to go on.
          </p>
          {mayEdit && (
            <>
              <FileChoice accept={CLIP_ACCEPT} onFile={choose}>
                Choose the same file
              </FileChoice>
              <Button kind="quiet" onClick={() => onLetGo(upload.id)}>
                Let go of it
              </Button>
            </>
          )}
        </div>
      )}
      {other && (
        <div className="suggestion mt-3 flex flex-wrap items-center gap-x-4 gap-y-2" role="alert">
          <p className="grow">
            <b>{other.name}</b> is another file than {upload.name}. Sent instead, what has arrived of {upload.name} is
            removed.
          </p>
          <Button
            onClick={() => {
              setOther(null);
              onFile(other);
            }}
          >
            Send it instead
          </Button>
          <Button kind="quiet" onClick={() => setOther(null)}>
            Leave as it is
          </Button>
        </div>
      )}
    </>
  );
}
