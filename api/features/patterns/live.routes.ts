import { Router } from 'express';
import { z } from 'zod';
import { LiveEvent, LiveQuery, SeatEdit } from '#contract/live';
import { idIn } from '../../http/asking.ts';
import { openEventStream } from '../../http/event-stream.ts';
import { answer, AppError } from '../../http/problem.ts';
import { personStillIn, signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { findSeenPattern } from './document.service.ts';
import { moveSeat, sitDown } from './live.service.ts';

const TabId = z.uuid();

/** The stream that an open bench listens to, and where its tab sits. */
export function liveRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();

  router.get('/patterns/:patternId/events', async (req, res) => {
    const who = signedIn(req);
    const patternId = idIn(req, 'patternId');
    const { tab } = LiveQuery.parse(req.query);
    await findSeenPattern(db, who, patternId);

    /** Somebody who signed out or was removed hears nothing more. */
    const mayStill = async () => {
      const person = await personStillIn(deps, req);
      return person !== null && (await findSeenPattern(db, person, patternId).then(() => true, isNotFound));
    };
    const seat = sitDown(
      deps,
      { patternId, who, tabId: tab },
      {
        send: (event) => stream.send(answer(LiveEvent, event)),
        onEnd: () => stream.end(),
      },
    );
    const stream = openEventStream(res, {
      onBeat: async () => {
        if (!(await mayStill())) return false;
        await seat.tellAgain();
        return true;
      },
      onEnd: seat.leave,
    });
  });

  router.put('/patterns/:patternId/seats/:tabId', async (req, res) => {
    const tabId = TabId.safeParse(req.params.tabId);
    if (!tabId.success) throw new AppError('not-found');
    const { lineId } = SeatEdit.parse(req.body);
    await moveSeat(db, signedIn(req), idIn(req, 'patternId'), { tabId: tabId.data, lineId });
    res.status(204).end();
  });

  return router;
}

function isNotFound(err: unknown): false {
  if (err instanceof AppError) return false;
  throw err;
}
