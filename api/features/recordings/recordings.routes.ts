import { Router } from 'express';
import { Recording, RecordingCreate, RecordingEdit, RecordingList } from '#contract/recordings';
import { idempotent } from '../../http/idempotency.ts';
import { CREATING, limit } from '../../http/limits.ts';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { askingIn, idIn } from '../../http/asking.ts';
import { clipRoutes } from './clips.routes.ts';
import { readingRoutes } from './readings.routes.ts';
import {
  addRecording,
  editRecording,
  listRecordings,
  putBackRecording,
  removeRecording,
} from './recordings.service.ts';
import { transcriptRoutes } from './transcripts.routes.ts';

/** Recordings of a pattern, their transcripts and clips. */
export function recordingRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();
  const at = '/patterns/:patternId/recordings/:recordingId';

  router.get('/patterns/:patternId/recordings', async (req, res) => {
    res.json(answer(RecordingList, await listRecordings(db, signedIn(req), idIn(req, 'patternId'))));
  });

  router.post('/patterns/:patternId/recordings', limit(deps, CREATING), idempotent(deps), async (req, res) => {
    const asked = RecordingCreate.parse(req.body);
    const recording = await addRecording(db, askingIn(deps, req), idIn(req, 'patternId'), asked);
    sendVersioned(res.status(201), answer(Recording, recording), recording.version);
  });

  router.patch(at, async (req, res) => {
    const row = { patternId: idIn(req, 'patternId'), id: idIn(req, 'recordingId'), version: ifMatchVersion(req) };
    const recording = await editRecording(db, askingIn(deps, req), row, RecordingEdit.parse(req.body));
    sendVersioned(res, answer(Recording, recording), recording.version);
  });

  router.delete(at, async (req, res) => {
    const row = { patternId: idIn(req, 'patternId'), id: idIn(req, 'recordingId'), version: ifMatchVersion(req) };
    await removeRecording(db, askingIn(deps, req), row);
    res.status(204).end();
  });

  router.post(`${at}/put-back`, async (req, res) => {
    const row = { patternId: idIn(req, 'patternId'), id: idIn(req, 'recordingId'), version: ifMatchVersion(req) };
    const recording = await putBackRecording(db, askingIn(deps, req), row);
    sendVersioned(res, answer(Recording, recording), recording.version);
  });

  router.use(transcriptRoutes(deps), readingRoutes(deps), clipRoutes(deps));
  return router;
}
