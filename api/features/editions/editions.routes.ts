import { Router, type Response } from 'express';
import { EditionList, Publish, PublishDesk, Withdrawal } from '#contract/editions';
import { CREATING, limit } from '../../http/limits.ts';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer } from '../../http/problem.ts';
import { sessionOf, signedIn, type Person } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { askingIn, idIn } from '../../http/asking.ts';
import { findRecordingClip, sendClip } from '../recordings/clips.service.ts';
import { captionFile } from './captions.ts';
import { openEdition, readEditions, recordingOf, withdrawEdition } from './editions.service.ts';
import { numberIn } from '../../http/number-in.ts';
import { publishEdition, readPublishDesk } from './publish.service.ts';

/** Editions: what holds the next one back, publishing, withdrawing, and what an edition's page plays. */
export function editionRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();

  const sendList = async (res: Response, who: Person, patternId: string) =>
    res.json(answer(EditionList, await readEditions(deps, who, patternId)));

  router.get('/patterns/:patternId/editions', async (req, res) => {
    await sendList(res, signedIn(req), idIn(req, 'patternId'));
  });

  router.get('/patterns/:patternId/next-edition', async (req, res) => {
    const desk = await readPublishDesk(db, signedIn(req), idIn(req, 'patternId'));
    sendVersioned(res, answer(PublishDesk, desk), desk.lastChange);
  });

  router.post('/patterns/:patternId/editions', limit(deps, CREATING), async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { patternId: idIn(req, 'patternId'), lastChange: ifMatchVersion(req) };
    const number = await publishEdition(db, asking, at, Publish.parse(req.body));
    res.status(201).location(`/api/patterns/${at.patternId}/editions/${number}`);
    await sendList(res, asking.who, at.patternId);
  });

  router.put('/patterns/:patternId/editions/:number/withdrawal', async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { patternId: idIn(req, 'patternId'), number: numberIn(req) };
    await withdrawEdition(db, asking, at, Withdrawal.parse(req.body).reason);
    await sendList(res, asking.who, at.patternId);
  });

  router.delete('/patterns/:patternId/editions/:number/withdrawal', async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { patternId: idIn(req, 'patternId'), number: numberIn(req) };
    await withdrawEdition(db, asking, at, null);
    await sendList(res, asking.who, at.patternId);
  });

  router.get('/editions/:code/:number/clips/:recording', async (req, res) => {
    const who = sessionOf(req)?.person ?? null;
    const seen = await openEdition(db, who, req.params.code, numberIn(req));
    const recordingId = await recordingOf(db, seen, numberIn(req, 'recording'));
    await sendClip(deps, await findRecordingClip(db, recordingId), req, res);
  });

  router.get('/editions/:code/:number/captions/:recording', async (req, res) => {
    const who = sessionOf(req)?.person ?? null;
    const seen = await openEdition(db, who, req.params.code, numberIn(req));
    const file = captionFile(seen.edition, numberIn(req, 'recording'));
    res.type('text/vtt; charset=utf-8').set('Cache-Control', 'private, no-cache').send(file);
  });

  return router;
}
