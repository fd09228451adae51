import { useState } from 'react';
import type { Recording, RecordingList } from '#contract/recordings';
import { ClipPanel } from './clip-panel.tsx';
import { DropZone } from './drop-zone.tsx';
import { HeardSide } from './heard-side.tsx';
import { useRecordingDeeds } from './recordings.queries.ts';
import { SourceSide } from './source-side.tsx';
import { TranscriptPanel } from './transcript-panel.tsx';
import type { RecordingFiles } from './use-recording-files.ts';

interface RecordingDeskProps {
  patternId: string;
  recording: Recording | undefined;
  room: RecordingList['storage'] | undefined;
  mayEdit: boolean;
  files: RecordingFiles;
  /** Stands above the clip: the recordings of the pattern, or the name of this one. */
  head?: React.ReactNode;
}

/** One recording: clip and transcript in the middle, the file and what was heard in it at the right. */
export function RecordingDesk({ patternId, recording, room, mayEdit, files, head }: RecordingDeskProps) {
  const deeds = useRecordingDeeds(patternId);
  const [chosen, setChosen] = useState(0);
  const transcript = recording?.transcript;
  return (
    <>
      <DropZone
        isOpen={mayEdit}
        onTranscript={files.sendTranscript}
        onClip={files.sendClip}
        className="flex min-w-0 flex-col border-r border-rule bg-sheet max-lg:border-b"
      >
        {head}
        <ClipPanel
          recording={recording}
          room={room}
          mayEdit={mayEdit}
          onFile={files.sendClip}
          onRemoveClip={() => recording && deeds.removeClip.mutate(recording)}
          onLetGo={(uploadId) => deeds.letGo.mutate(uploadId)}
          onChanged={files.refresh}
        />
        <TranscriptPanel
          recording={recording}
          mayEdit={mayEdit}
          refusal={files.refusal}
          isSending={files.isSending}
          chosen={chosen}
          onChoose={setChosen}
          onFile={files.sendTranscript}
          onReadAgain={(transcriptId) => deeds.readAgain.mutate({ transcriptId })}
        />
      </DropZone>
      <aside aria-label="The file and what was heard" className="flex min-w-0 flex-col bg-sheet">
        <HeardSide
          patternId={patternId}
          recording={recording}
          mayEdit={mayEdit}
          isReading={deeds.readAgain.isPending || transcript?.reading.state === 'waiting'}
          onTerms={(terms) => transcript && deeds.readAgain.mutate({ transcriptId: transcript.id, terms })}
        />
        {transcript && <SourceSide key={transcript.id} transcript={transcript} chosen={chosen} mayEdit={mayEdit} />}
      </aside>
    </>
  );
}
