import { Router } from 'express';
import { Upload } from '#contract/recordings';
import { ClipStart, ClipStarted, PartRef, PartTaken } from '#contract/uploads';
import { CREATING, limit } from '../../http/limits.ts';
import { answer, AppError } from '../../http/problem.ts';
import { sessionOf, signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { askingIn, idIn } from '../../http/asking.ts';
import { removeClip } from './clip-remove.service.ts';
import { findWatchableClip, sendClip } from './clips.service.ts';
import { PartBuffers } from './part-buffers.ts';
import { readPartForm } from './part-form.ts';
import { cancelUpload, completeUpload, readUpload } from './upload-end.service.ts';
import { takePart } from './upload-parts.service.ts';
import { LARGEST_PART_BYTES, startClip } from './upload-start.service.ts';

/** A recording's clip: its way up in parts, and its way back in ranges. */
export function clipRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();
  const buffers = new PartBuffers(LARGEST_PART_BYTES);

  router.post('/recordings/:recordingId/clip', limit(deps, CREATING), async (req, res) => {
    const started = await startClip(deps, signedIn(req), idIn(req, 'recordingId'), ClipStart.parse(req.body));
    res.status(201).json(answer(ClipStarted, started));
  });

  router.put('/uploads/:uploadId/parts/:n', async (req, res) => {
    const who = signedIn(req);
    const ref = PartRef.safeParse(req.params);
    if (!ref.success) throw new AppError('not-found');
    // Bytes stay on the wire until a buffer is free; what one holds is given back whatever happens.
    const buffer = await buffers.take(who.id);
    try {
      const part = await takePart(deps, who, ref.data, (size, known) =>
        readPartForm(req, res, { buffer, limit: size, known }),
      );
      res.json(answer(PartTaken, part));
    } finally {
      buffers.giveBack(who.id, buffer);
    }
  });

  router.get('/uploads/:uploadId', async (req, res) => {
    res.json(answer(Upload, await readUpload(deps, signedIn(req), idIn(req, 'uploadId'))));
  });

  router.post('/uploads/:uploadId/complete', async (req, res) => {
    res.status(202).json(answer(Upload, await completeUpload(deps, signedIn(req), idIn(req, 'uploadId'))));
  });

  router.delete('/uploads/:uploadId', async (req, res) => {
    await cancelUpload(deps, signedIn(req), idIn(req, 'uploadId'));
    res.status(204).end();
  });

  router.get('/recordings/:recordingId/clip', async (req, res) => {
    const who = sessionOf(req)?.person ?? null;
    await sendClip(deps, await findWatchableClip(db, who, idIn(req, 'recordingId')), req, res);
  });

  router.delete('/recordings/:recordingId/clip', async (req, res) => {
    await removeClip(db, askingIn(deps, req), idIn(req, 'recordingId'));
    res.status(204).end();
  });

  return router;
}
