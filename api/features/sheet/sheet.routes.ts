import { pipeline } from 'node:stream/promises';
import { Router, type Response } from 'express';
import { projectEdition } from '#crochet';
import { PublicEdition, SheetQuery, type SheetQuery as Asked } from '#contract/editions';
import { limit, type Limit } from '../../http/limits.ts';
import { answer } from '../../http/problem.ts';
import { sessionOf, signedIn } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import { draftEdition } from '../editions/drafts.service.ts';
import { openEdition, type SeenEdition } from '../editions/editions.service.ts';
import { numberIn } from '../../http/number-in.ts';
import { idIn } from '../../http/asking.ts';
import { findSeenPattern } from '../patterns/document.service.ts';
import { openKeptSheet } from './sheet-files.service.ts';
import { makeSheet, sheetFileName } from './sheet.service.ts';

/** Drawing a sheet costs more than reading a row. */
const DRAWING: Limit = { name: 'sheets', max: 60, perMs: 60_000 };

function sendPdf(res: Response, fileName: string, bytes: number, keeping: string): Response {
  return res.set({
    'Content-Type': 'application/pdf',
    'Content-Length': String(bytes),
    'Content-Disposition': `inline; filename="${fileName}"`,
    'Cache-Control': keeping,
  });
}

async function sendEditionSheet(deps: Deps, seen: SeenEdition, asked: Asked, res: Response): Promise<void> {
  const { paper = seen.paper, terms = seen.edition.terms } = asked;
  const keeping = seen.visibility === 'private' ? 'private, no-store' : 'public, max-age=300';
  const kept = await openKeptSheet(deps, seen.id, paper, terms);
  if (kept) {
    sendPdf(res, sheetFileName(seen.edition, paper, terms), kept.bytes, keeping);
    await pipeline(kept.body, res);
    return;
  }
  const options = { paper, terms, studioPaper: seen.paper, publicUrl: deps.env.publicUrl, made: seen.publishedAt };
  const { pdf, fileName } = await makeSheet(seen.edition, options);
  sendPdf(res, fileName, pdf.byteLength, keeping).send(pdf);
}

/** Sheets as PDF: the draft's for the studio, an edition's for everybody who may see its page. */
export function sheetRoutes(deps: Deps): Router {
  const { db, env, clock } = deps;
  const router = Router();
  const drawing = limit(deps, DRAWING);

  router.get('/patterns/:patternId/sheet.pdf', drawing, async (req, res) => {
    const asked = SheetQuery.parse(req.query);
    const pattern = await findSeenPattern(db, signedIn(req), idIn(req, 'patternId'));
    const { document, paper } = await draftEdition(db, pattern.id);
    const shown = answer(PublicEdition, projectEdition(document));
    const options = { ...asked, studioPaper: paper, publicUrl: env.publicUrl, made: clock.now() };
    const { pdf, fileName } = await makeSheet(shown, options);
    sendPdf(res, fileName, pdf.byteLength, 'private, no-store').send(pdf);
  });

  router.get('/editions/:code/:number/sheet.pdf', drawing, async (req, res) => {
    const asked = SheetQuery.parse(req.query);
    const who = sessionOf(req)?.person ?? null;
    const seen = await openEdition(db, who, String(req.params.code), numberIn(req));
    await sendEditionSheet(deps, seen, asked, res);
  });

  return router;
}
