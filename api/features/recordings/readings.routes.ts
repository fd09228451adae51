import { Router } from 'express';
import { HeardWords, ReadingDifferences, ReadingTake, WordsUsed } from '#contract/readings';
import { ReadingTaken } from '#contract/recordings';
import { askingIn, idIn, tellDeed } from '../../http/asking.ts';
import { answer } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { takeHeardWords } from '../patterns/heard-words.service.ts';
import { readDifferences, takeReading } from './readings.service.ts';

/** Readings held against a pattern and taken into it, and words of a transcript that somebody chose. */
export function readingRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();
  const at = '/patterns/:patternId/readings/:readingId';

  router.get(`${at}/differences`, async (req, res) => {
    const ids = { patternId: idIn(req, 'patternId'), readingId: idIn(req, 'readingId') };
    res.json(answer(ReadingDifferences, await readDifferences(db, signedIn(req), ids)));
  });

  router.post(`${at}/take`, async (req, res) => {
    const ids = { patternId: idIn(req, 'patternId'), readingId: idIn(req, 'readingId') };
    const { taken, deedId } = await takeReading(db, askingIn(deps, req), ids, ReadingTake.parse(req.body ?? {}));
    tellDeed(res, deedId).json(answer(ReadingTaken, taken));
  });

  router.post('/patterns/:patternId/heard-words', async (req, res) => {
    const words = HeardWords.parse(req.body);
    const { used, deedId } = await takeHeardWords(db, askingIn(deps, req), idIn(req, 'patternId'), words);
    tellDeed(res, deedId).status(201).json(answer(WordsUsed, used));
  });

  return router;
}
