import { Router } from 'express';
import type { ZodType } from 'zod';
import {
  CautionCreate,
  CautionEdit,
  MaterialCreate,
  MaterialEdit,
  NoteCreate,
  NoteEdit,
  SpecialStitchCreate,
  SpecialStitchEdit,
} from '#contract/pattern-details';
import { LeftCheckCreate, LeftCheckEdit } from '#contract/checks';
import { LineCreate, LineEdit, MarkCreate, MarkEdit, PieceCreate, PieceEdit } from '#contract/rows';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer } from '../../http/problem.ts';
import type { Deps } from '../../platform/deps.ts';
import { ANSWERS } from './answers.ts';
import { askingIn, idIn, tellDeed } from '../../http/asking.ts';
import type { Fields, RowEntity } from './entities.ts';
import { createRow, editRow, removeRow } from './rows.service.ts';

interface Kind {
  readonly path: string;
  readonly entity: RowEntity;
  readonly create: ZodType;
  readonly edit: ZodType;
}

const KINDS: readonly Kind[] = [
  { path: 'pieces', entity: 'piece', create: PieceCreate, edit: PieceEdit },
  { path: 'lines', entity: 'line', create: LineCreate, edit: LineEdit },
  { path: 'marks', entity: 'mark', create: MarkCreate, edit: MarkEdit },
  { path: 'materials', entity: 'material', create: MaterialCreate, edit: MaterialEdit },
  { path: 'cautions', entity: 'caution', create: CautionCreate, edit: CautionEdit },
  { path: 'notes', entity: 'note', create: NoteCreate, edit: NoteEdit },
  { path: 'special-stitches', entity: 'special-stitch', create: SpecialStitchCreate, edit: SpecialStitchEdit },
  { path: 'left-checks', entity: 'left-check', create: LeftCheckCreate, edit: LeftCheckEdit },
];

function kindRoutes(deps: Deps, { path, entity, create, edit }: Kind): Router {
  const router = Router();

  router.post(`/patterns/:patternId/${path}`, async (req, res) => {
    const asking = askingIn(deps, req);
    const asked = create.parse(req.body) as Fields;
    const { row, deedId, isNew } = await createRow(deps.db, asking, idIn(req, 'patternId'), entity, asked);
    tellDeed(res, deedId).status(isNew ? 201 : 200);
    sendVersioned(res, answer(ANSWERS[entity], row), row.version);
  });

  router.patch(`/${path}/:id`, async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { id: idIn(req, 'id'), version: ifMatchVersion(req) };
    const { row, deedId } = await editRow(deps.db, asking, entity, at, edit.parse(req.body) as Fields);
    sendVersioned(tellDeed(res, deedId), answer(ANSWERS[entity], row), row.version);
  });

  router.delete(`/${path}/:id`, async (req, res) => {
    const asking = askingIn(deps, req);
    const at = { id: idIn(req, 'id'), version: ifMatchVersion(req) };
    tellDeed(res, (await removeRow(deps.db, asking, entity, at)).deedId)
      .status(204)
      .end();
  });

  return router;
}

/** Everything that a pattern is made of, one way for all of it: made under the pattern, written and taken away by id. */
export function rowRoutes(deps: Deps): Router {
  const router = Router();
  for (const kind of KINDS) router.use(kindRoutes(deps, kind));
  return router;
}
