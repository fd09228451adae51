import { Router, type Request, type RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { CaptionCorrections, CorrectionsTake, ReadingAsk } from '#contract/readings';
import { Cue, CueEdit, CueList, Transcript, TranscriptHead, TRANSCRIPT_BYTES } from '#contract/recordings';
import { idempotent } from '../../http/idempotency.ts';
import { CREATING, limit } from '../../http/limits.ts';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer, AppError } from '../../http/problem.ts';
import { signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { askingIn, idIn } from '../../http/asking.ts';
import { listCorrections, takeCorrections } from './corrections.service.ts';
import {
  addTranscript,
  correctCue,
  readAgain,
  readCues,
  readTranscriptOf,
  type SentFile,
} from './transcripts.service.ts';

const readForm = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: TRANSCRIPT_BYTES, files: 1, fields: 0, parts: 1 },
  defParamCharset: 'utf8',
}).single('file');

/** One file in the field "file"; larger than a transcript may be, it is not read to its end. */
const oneFile: RequestHandler = (req, res, next) => {
  void readForm(req, res, (err: unknown) => {
    const large = err instanceof MulterError && err.code === 'LIMIT_FILE_SIZE';
    next(large ? new AppError('too-large', 'A transcript may have 5 MB. Nothing was kept.') : err);
  });
};

function fileIn(req: Request): SentFile {
  if (!req.file) throw new AppError('bad-request', 'A transcript is sent as a form with the file in the field "file".');
  return { name: req.file.originalname.slice(0, 500), type: req.file.mimetype, bytes: req.file.buffer };
}

/** Transcripts of a recording, their captions and readings. */
export function transcriptRoutes(deps: Deps): Router {
  const { db } = deps;
  const router = Router();
  const signedInFirst: RequestHandler = (req, _res, next) => {
    signedIn(req);
    next();
  };

  router.post(
    '/recordings/:recordingId/transcripts',
    signedInFirst,
    limit(deps, CREATING),
    oneFile,
    idempotent(deps),
    async (req, res) => {
      const head = await addTranscript(db, askingIn(deps, req), idIn(req, 'recordingId'), fileIn(req));
      res.status(201).location(`/api/transcripts/${head.id}`).json(answer(TranscriptHead, head));
    },
  );

  router.get('/transcripts/:transcriptId', async (req, res) => {
    res.json(answer(Transcript, await readTranscriptOf(db, signedIn(req), idIn(req, 'transcriptId'))));
  });

  router.get('/transcripts/:transcriptId/cues', async (req, res) => {
    res.json(answer(CueList, await readCues(db, signedIn(req), idIn(req, 'transcriptId'))));
  });

  router.post('/transcripts/:transcriptId/readings', limit(deps, CREATING), async (req, res) => {
    const asked = ReadingAsk.parse(req.body ?? {});
    const head = await readAgain(db, askingIn(deps, req), idIn(req, 'transcriptId'), asked);
    res.status(202).json(answer(TranscriptHead, head));
  });

  router.get('/transcripts/:transcriptId/corrections', async (req, res) => {
    const told = await listCorrections(db, signedIn(req), idIn(req, 'transcriptId'));
    res.json(answer(CaptionCorrections, told));
  });

  router.post('/transcripts/:transcriptId/corrections', async (req, res) => {
    const asked = CorrectionsTake.parse(req.body);
    const told = await takeCorrections(db, askingIn(deps, req), idIn(req, 'transcriptId'), asked);
    res.json(answer(CaptionCorrections, told));
  });

  router.patch('/cues/:cueId', async (req, res) => {
    const at = { id: idIn(req, 'cueId'), version: ifMatchVersion(req) };
    const cue = await correctCue(db, askingIn(deps, req), at, CueEdit.parse(req.body).corrected);
    sendVersioned(res, answer(Cue, cue), cue.version);
  });

  return router;
}
