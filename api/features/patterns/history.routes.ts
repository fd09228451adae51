import { Router } from 'express';
import { ChangePage, ChangesQuery, Undone } from '#contract/changes';
import { answer } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { askingIn, idIn, tellDeed } from '../../http/asking.ts';
import { readHistory } from './history.service.ts';
import { undoDeed } from './undo.service.ts';

/** What was done to a pattern, and taking back one's own last step. */
export function historyRoutes(deps: Deps): Router {
  const router = Router();

  router.get('/patterns/:patternId/changes', async (req, res) => {
    const page = await readHistory(deps.db, signedIn(req), idIn(req, 'patternId'), ChangesQuery.parse(req.query));
    res.json(answer(ChangePage, page));
  });

  for (const which of ['undo', 'redo'] as const) {
    router.post(`/patterns/:patternId/${which}`, async (req, res) => {
      const undone = await undoDeed(deps.db, askingIn(deps, req), idIn(req, 'patternId'), which);
      tellDeed(res, undone.deedId).json(answer(Undone, undone));
    });
  }

  return router;
}
