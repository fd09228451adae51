import { createHash } from 'node:crypto';
import { readFile, stat } from 'node:fs/promises';
import path from 'node:path';
import { FIRST_BYTES } from '../api/contract/uploads.ts';
import { addRecording, listRecordings } from '../api/features/recordings/recordings.service.ts';
import { addTranscript } from '../api/features/recordings/transcripts.service.ts';
import { completeUpload } from '../api/features/recordings/upload-end.service.ts';
import { takePart } from '../api/features/recordings/upload-parts.service.ts';
import { startClip } from '../api/features/recordings/upload-start.service.ts';
import type { Person } from '../api/http/session.ts';
import type { Deps } from '../api/platform/deps.ts';
import { PROJECT_ROOT } from '../api/platform/project-root.ts';
import { until } from './jobs.ts';
import type { RecordingSpec } from './spec.ts';

const CLIPS = path.join(PROJECT_ROOT, 'seeds/clips');
const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

/** Sends a clip in parts, as a browser does, and waits until it is whole. */
async function sendClip(deps: Deps, who: Person, patternId: string, recordingId: string, name: string): Promise<void> {
  const file = path.join(CLIPS, name);
  const bytes = await readFile(file);
  const { uploadId, partSize } = await startClip(deps, who, recordingId, {
    name,
    size: bytes.length,
    lastModified: Math.round((await stat(file)).mtimeMs),
    firstMiBSha256: sha256(bytes.subarray(0, FIRST_BYTES)),
  });
  for (let n = 1; (n - 1) * partSize < bytes.length; n += 1) {
    const part = bytes.subarray((n - 1) * partSize, n * partSize);
    await takePart(deps, who, { uploadId, n }, () => Promise.resolve({ sha256: sha256(part), bytes: part }));
  }
  await completeUpload(deps, who, uploadId);
  await until(`the clip ${name}`, async () => {
    const { recordings } = await listRecordings(deps.db, who, patternId);
    return recordings.find((r) => r.id === recordingId)?.clip;
  });
}

/** Adds a recording with its transcript, read, and its clip. */
export async function addSeedRecording(
  deps: Deps,
  asking: { readonly who: Person; readonly now: Date },
  patternId: string,
  spec: RecordingSpec,
): Promise<void> {
  const { title, publicUrl = null, publicOffsetMs = 0 } = spec;
  const { id } = await addRecording(deps.db, asking, patternId, { title, publicUrl, publicOffsetMs });
  const bytes = await readFile(path.join(CLIPS, spec.transcript));
  const type = spec.transcript.endsWith('.vtt') ? 'text/vtt' : 'text/plain';
  await addTranscript(deps.db, asking, id, { name: spec.transcript, type, bytes });
  await until(`the reading of ${spec.transcript}`, async () => {
    const { recordings } = await listRecordings(deps.db, asking.who, patternId);
    return recordings.find((r) => r.id === id)?.transcript?.reading.state === 'done';
  });
  if (spec.clip !== undefined) await sendClip(deps, asking.who, patternId, id, spec.clip);
}
