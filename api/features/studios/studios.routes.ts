import { Router } from 'express';
import {
  Invitation,
  InvitationCreate,
  InvitationJoin,
  InvitationLook,
  InvitationToken,
  Joined,
  MemberEdit,
  Studio,
  StudioCreate,
  StudioEdit,
  StudioList,
  StudioPeople,
} from '#contract/studios';
import { idIn } from '../../http/asking.ts';
import { idempotent } from '../../http/idempotency.ts';
import { CREATING, limit } from '../../http/limits.ts';
import { ifMatchVersion, sendVersioned } from '../../http/preconditions.ts';
import { answer } from '../../http/problem.ts';
import { signedIn, startSession } from '../../http/session.ts';
import type { Deps } from '../../platform/deps.ts';
import {
  acceptInvitation,
  invite,
  joinByInvitation,
  lookAtInvitation,
  takeBackInvitation,
} from './invitations.service.ts';
import { changeRole, listPeople, removeMember } from './members.service.ts';
import { editStudio, listStudios, openStudio, showStudio } from './studios.service.ts';

/** Studios, their people, and the invitations that let people in. */
export function studioRoutes(deps: Deps): Router {
  const router = Router();

  router.post('/studios', limit(deps, CREATING), idempotent(deps), async (req, res) => {
    const who = signedIn(req);
    const studio = await openStudio(deps, who, StudioCreate.parse(req.body).name);
    res.status(201).location(`/api/studios/${studio.id}`).set('ETag', `"${studio.version}"`);
    res.json(answer(Studio, studio));
  });

  router.get('/studios', async (req, res) => {
    res.json(answer(StudioList, await listStudios(deps.db, signedIn(req))));
  });

  router.get('/studios/:studioId', async (req, res) => {
    const who = signedIn(req);
    const studio = await showStudio(deps.db, who, idIn(req, 'studioId'));
    sendVersioned(res, answer(Studio, studio), studio.version);
  });

  router.patch('/studios/:studioId', async (req, res) => {
    const who = signedIn(req);
    const studioId = idIn(req, 'studioId');
    const studio = await editStudio(deps.db, who, studioId, StudioEdit.parse(req.body), ifMatchVersion(req));
    sendVersioned(res, answer(Studio, studio), studio.version);
  });

  router.get('/studios/:studioId/members', async (req, res) => {
    const who = signedIn(req);
    res.json(answer(StudioPeople, await listPeople(deps, who, idIn(req, 'studioId'))));
  });

  router.patch('/studios/:studioId/members/:personId', async (req, res) => {
    const who = signedIn(req);
    const { role } = MemberEdit.parse(req.body);
    await changeRole(deps.db, who, idIn(req, 'studioId'), idIn(req, 'personId'), role);
    res.status(204).end();
  });

  router.delete('/studios/:studioId/members/:personId', async (req, res) => {
    const who = signedIn(req);
    await removeMember(deps, who, idIn(req, 'studioId'), idIn(req, 'personId'));
    res.status(204).end();
  });

  router.post('/studios/:studioId/invitations', limit(deps, CREATING), async (req, res) => {
    const who = signedIn(req);
    const invitation = await invite(deps, who, idIn(req, 'studioId'), InvitationCreate.parse(req.body));
    res.status(201).json(answer(Invitation, invitation));
  });

  router.delete('/studios/:studioId/invitations/:invitationId', async (req, res) => {
    const who = signedIn(req);
    await takeBackInvitation(deps, who, idIn(req, 'studioId'), idIn(req, 'invitationId'));
    res.status(204).end();
  });

  // The token comes in the body, so that it stands in no log. Looking changes nothing.
  router.post('/invitations/look', limit(deps, CREATING), async (req, res) => {
    res.json(answer(InvitationLook, await lookAtInvitation(deps, InvitationToken.parse(req.body).token)));
  });

  router.post('/invitations/accept', limit(deps, CREATING), async (req, res) => {
    const who = signedIn(req);
    res.json(answer(Joined, await acceptInvitation(deps, who, InvitationToken.parse(req.body).token)));
  });

  router.post('/invitations/join', limit(deps, CREATING), async (req, res) => {
    const { personId, joined } = await joinByInvitation(deps, InvitationJoin.parse(req.body));
    await startSession(deps, req, res, personId);
    res.status(201).json(answer(Joined, joined));
  });

  return router;
}
