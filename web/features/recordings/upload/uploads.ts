import { useSyncExternalStore } from 'react';
import { ClipUpload } from './clip-upload.ts';
import { hasEnded, type UploadState } from './upload-state.ts';

/** What is shown of an upload wherever it stands: on its page, and in the dock of every other. */
export interface UploadEntry {
  readonly recordingId: string;
  readonly patternId: string;
  readonly title: string;
  readonly fileName: string;
  readonly state: UploadState;
}

interface Kept {
  readonly upload: ClipUpload;
  readonly patternId: string;
  readonly title: string;
}

/** Uploads of this tab. They live beside the pages, so that leaving a page stops none of them. */
const kept = new Map<string, Kept>();
const listeners = new Set<() => void>();
let entries: readonly UploadEntry[] = [];

const isMoving = ({ state }: UploadEntry) => !hasEnded(state) && state.phase !== 'paused';

function warnBeforeLeaving(event: BeforeUnloadEvent): void {
  event.preventDefault();
}

function tell(): void {
  entries = [...kept.values()].map(({ upload, patternId, title }) => ({
    recordingId: upload.recordingId,
    patternId,
    title,
    fileName: upload.file.name,
    state: upload.state,
  }));
  if (entries.some(isMoving)) window.addEventListener('beforeunload', warnBeforeLeaving);
  else window.removeEventListener('beforeunload', warnBeforeLeaving);
  for (const listener of listeners) listener();
}

/** Begins to send a file as the clip of a recording; one that was under way in this tab stops. */
export function startUpload(
  of: { readonly recordingId: string; readonly patternId: string; readonly title: string },
  file: File,
) {
  kept.get(of.recordingId)?.upload.pause();
  const { patternId, title } = of;
  kept.set(of.recordingId, { patternId, title, upload: new ClipUpload(of.recordingId, file, tell) });
  tell();
}

export const pauseUpload = (recordingId: string): void => kept.get(recordingId)?.upload.pause();
export const goOnWithUpload = (recordingId: string): void => kept.get(recordingId)?.upload.goOn();

/** @throws UnreachableError | ProblemError where the server could not be told; it lets go of it by itself in a week */
export async function cancelUpload(recordingId: string): Promise<void> {
  const upload = kept.get(recordingId)?.upload;
  forgetUpload(recordingId);
  await upload?.cancel();
}

/** Takes one that has ended, or was told about, out of sight. */
export function forgetUpload(recordingId: string): void {
  kept.delete(recordingId);
  tell();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Every upload of this tab. */
export const useUploads = (): readonly UploadEntry[] => useSyncExternalStore(subscribe, () => entries);

export const useUpload = (recordingId: string | undefined): UploadEntry | undefined =>
  useUploads().find((entry) => entry.recordingId === recordingId);
