import { useState } from 'react';
import { sendTranscript } from './recordings.queries.ts';
import { startUpload } from './upload/uploads.ts';

/** The recording a file goes to, made when it is first needed. */
export type EnsureRecording = (fileName: string) => Promise<{ patternId: string; recordingId: string; title: string }>;

export interface RecordingFiles {
  readonly sendClip: (file: File) => void;
  readonly sendTranscript: (file: File) => void;
  readonly isSending: boolean;
  readonly refusal: { readonly fileName: string; readonly error: unknown } | null;
  readonly refresh: () => void;
}

/** What happens to a file that was chosen or dropped. */
export function useRecordingFiles(ensure: EnsureRecording, refresh: () => void): RecordingFiles {
  const [isSending, setSending] = useState(false);
  const [refusal, setRefusal] = useState<RecordingFiles['refusal']>(null);
  const attempt = async (file: File, work: (to: Awaited<ReturnType<EnsureRecording>>) => unknown) => {
    setRefusal(null);
    setSending(true);
    try {
      await work(await ensure(file.name));
    } catch (error) {
      setRefusal({ fileName: file.name, error });
    } finally {
      setSending(false);
      refresh();
    }
  };
  return {
    isSending,
    refusal,
    refresh,
    sendClip: (file) => void attempt(file, (to) => startUpload(to, file)),
    sendTranscript: (file) => void attempt(file, ({ recordingId }) => sendTranscript(recordingId, file)),
  };
}

/** A name for a recording, from its file: "harvest-mouse_part 2.vtt" is "Harvest mouse part 2". */
export function nameOfFile(fileName: string): string {
  const stem = fileName
    .replace(/\.[^.]+$/, '')
    .replace(/[-_.]+/g, ' ')
    .trim();
  return stem === '' ? 'Recording' : `${stem.charAt(0).toUpperCase()}${stem.slice(1)}`.slice(0, 200);
}
