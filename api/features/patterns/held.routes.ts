import { Router, type Request } from 'express';
import { CutTake, Followed, HeldAgainst, HeldTake, NewCut } from '#contract/held';
import { askingIn, idIn, tellDeed } from '../../http/asking.ts';
import { answer } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { readCut, takeCut } from './cut.service.ts';
import { readHeld, takeHeld } from './held.service.ts';

const ofIn = (req: Request) => ({ patternId: idIn(req, 'patternId'), recordingId: idIn(req, 'recordingId') });

/** A written pattern held against a recording, and the moments of a recording that was cut anew. */
export function heldRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();
  const at = '/patterns/:patternId/recordings/:recordingId';

  router.get(`${at}/held`, async (req, res) => {
    res.json(answer(HeldAgainst, await readHeld(db, signedIn(req), ofIn(req))));
  });

  router.post(`${at}/held`, async (req, res) => {
    const followed = await takeHeld(db, askingIn(deps, req), ofIn(req), HeldTake.parse(req.body));
    tellDeed(res, followed.deedId).json(answer(Followed, followed));
  });

  router.get(`${at}/cut`, async (req, res) => {
    res.json(answer(NewCut, await readCut(db, signedIn(req), ofIn(req))));
  });

  router.post(`${at}/cut`, async (req, res) => {
    const followed = await takeCut(db, askingIn(deps, req), ofIn(req), CutTake.parse(req.body));
    tellDeed(res, followed.deedId).json(answer(Followed, followed));
  });

  return router;
}
