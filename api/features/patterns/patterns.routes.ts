import { Router } from 'express';
import { Pattern, PatternCreate, PatternEdit, PatternHead, PatternStateChange } from '#contract/patterns';
import { CheckList } from '#contract/checks';
import { Shelf, ShelfQuery } from '#contract/shelf';
import { WrittenPattern } from '#contract/written';
import { idempotent } from '../../http/idempotency.ts';
import { CREATING, limit } from '../../http/limits.ts';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { askingIn, idIn, tellDeed } from '../../http/asking.ts';
import { readChecks } from './checks.service.ts';
import { readPattern } from './document.service.ts';
import { duplicatePattern } from './duplicate.service.ts';
import { heldRoutes } from './held.routes.ts';
import { historyRoutes } from './history.routes.ts';
import { liveRoutes } from './live.routes.ts';
import { createPattern, editPattern, stepPattern } from './patterns.service.ts';
import { rowRoutes } from './rows.routes.ts';
import { readShelf } from './shelf.service.ts';
import { takeWrittenPattern } from './written-pattern.service.ts';

/** Patterns: the shelf, the bench document, and what is done with a pattern as a whole. */
export function patternRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();
  const makes = [limit(deps, CREATING), idempotent(deps)];

  router.get('/patterns', async (req, res) => {
    const shelf = await readShelf(db, signedIn(req), ShelfQuery.parse(req.query));
    res.json(answer(Shelf, shelf));
  });

  router.post('/patterns', ...makes, async (req, res) => {
    const head = await createPattern(db, askingIn(deps, req), PatternCreate.parse(req.body));
    res.status(201).location(`/api/patterns/${head.id}`);
    sendVersioned(res, answer(PatternHead, head), head.version);
  });

  router.post('/patterns/written', ...makes, async (req, res) => {
    const head = await takeWrittenPattern(db, askingIn(deps, req), WrittenPattern.parse(req.body));
    res.status(201).location(`/api/patterns/${head.id}`);
    sendVersioned(res, answer(PatternHead, head), head.version);
  });

  router.get('/patterns/:patternId', async (req, res) => {
    const pattern = await readPattern(db, signedIn(req), idIn(req, 'patternId'));
    sendVersioned(res, answer(Pattern, pattern), pattern.version);
  });

  router.get('/patterns/:patternId/checks', async (req, res) => {
    res.json(answer(CheckList, await readChecks(db, signedIn(req), idIn(req, 'patternId'))));
  });

  router.patch('/patterns/:patternId', async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { id: idIn(req, 'patternId'), version: ifMatchVersion(req) };
    const { head, deedId } = await editPattern(db, asking, at, PatternEdit.parse(req.body));
    sendVersioned(tellDeed(res, deedId), answer(PatternHead, head), head.version);
  });

  router.post('/patterns/:patternId/state', async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { id: idIn(req, 'patternId'), version: ifMatchVersion(req) };
    const head = await stepPattern(db, asking, at, PatternStateChange.parse(req.body).state);
    sendVersioned(res, answer(PatternHead, head), head.version);
  });

  for (const step of ['bin', 'restore', 'archive', 'unarchive'] as const) {
    router.post(`/patterns/:patternId/${step}`, async (req, res) => {
      const at = { id: idIn(req, 'patternId'), version: ifMatchVersion(req) };
      const head = await stepPattern(db, askingIn(deps, req), at, step);
      sendVersioned(res, answer(PatternHead, head), head.version);
    });
  }

  router.post('/patterns/:patternId/duplicate', ...makes, async (req, res) => {
    const head = await duplicatePattern(db, askingIn(deps, req), idIn(req, 'patternId'));
    res.status(201).location(`/api/patterns/${head.id}`);
    sendVersioned(res, answer(PatternHead, head), head.version);
  });

  router.use(historyRoutes(deps), heldRoutes(deps), rowRoutes(deps), liveRoutes(deps));
  return router;
}
