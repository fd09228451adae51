import { randomUUID } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import type { Pattern } from '#contract/patterns';
import { buildHouse } from '../../support/builders.ts';
import { settleIn } from './at-home.ts';

const home = settleIn();
const { call } = home;

const round = (n: number, text: string) => ({ kind: 'round', label: `R${n}`, from: n, to: n, text });

const kettleHolder = () => ({
  id: randomUUID(),
  studioId: home.house.studio.id,
  title: 'Kettle holder',
  terms: 'UK',
  sizes: [],
  pieces: [
    {
      name: 'Front',
      make: 2,
      worked: 'joined',
      lines: [
        round(1, '6 dc in magic ring (6)'),
        { kind: 'step', label: '', from: null, to: null, text: 'Change to colour B.' },
        round(2, 'inc x 6 (12)'),
      ],
    },
    { name: 'Loop', make: 1, worked: 'rows', lines: [] },
  ],
  materials: [{ kind: 'hook', name: '3.5 mm hook' }],
  notes: ['Work tightly.'],
  specialStitches: [{ name: 'Shell', abbreviation: 'sh', text: '5 tr in one st' }],
});
const send = (body: object, who = home.house.creator) => call(who, 'post', 'patterns/written', { body });
const read = async (id: string) => (await call(home.house.creator, 'get', `patterns/${id}`)).body as Pattern;

describe('a written pattern that comes in', () => {
  test('is a pattern like any other: pieces, lines, steps and all else in the order of the text', async () => {
    const asked = kettleHolder();
    const answer = await send(asked);
    expect(answer.status).toBe(201);
    const pattern = await read(asked.id);
    expect(pattern).toMatchObject({ title: 'Kettle holder', terms: 'UK', state: 'drafting' });
    expect(pattern.pieces.map(({ name, make, worked }) => [name, make, worked])).toEqual([
      ['Front', 2, 'joined'],
      ['Loop', 1, 'rows'],
    ]);
    expect(pattern.lines.map(({ text }) => text)).toEqual([
      '6 dc in magic ring (6)',
      'Change to colour B.',
      'inc x 6 (12)',
    ]);
    expect(new Set(pattern.lines.map(({ shortId }) => shortId)).size).toBe(3);
    expect(pattern.materials.map(({ name }) => name)).toEqual(['3.5 mm hook']);
    expect(pattern.notes.map(({ text }) => text)).toEqual(['Work tightly.']);
    expect(pattern.specialStitches.map(({ abbreviation }) => abbreviation)).toEqual(['sh']);
  });

  test('goes back in one undo and comes again in one redo', async () => {
    const asked = kettleHolder();
    await send(asked);
    expect((await call(home.house.creator, 'post', `patterns/${asked.id}/undo`)).status).toBe(200);
    const empty = await read(asked.id);
    expect([empty.pieces, empty.lines, empty.materials, empty.notes, empty.specialStitches].flat()).toEqual([]);
    expect(empty.mayUndo).toBe(false);
    expect((await call(home.house.creator, 'post', `patterns/${asked.id}/redo`)).status).toBe(200);
    expect((await read(asked.id)).lines).toHaveLength(3);
  });

  test('sent again, and sent twice at once, is made once', async () => {
    const asked = kettleHolder();
    const both = await Promise.all([send(asked), send(asked)]);
    expect(both.map(({ status }) => status)).toEqual([201, 201]);
    expect((await send(asked)).status).toBe(201);
    const pattern = await read(asked.id);
    expect(pattern.pieces).toHaveLength(2);
    expect(pattern.lines).toHaveLength(3);
  });

  test('of another studio is refused, and an id that stands elsewhere is a conflict', async () => {
    const other = await buildHouse(home.server.db);
    expect((await send(kettleHolder(), other.creator)).status).toBe(404);
    const asked = kettleHolder();
    await send(asked);
    expect((await send({ ...asked, studioId: other.studio.id }, other.creator)).status).toBe(409);
  });

  test('that is empty, too long or holds something unknown is refused by the name of its place', async () => {
    const tooMany = Array.from({ length: 1_600 }, (_, i) => round(i + 1, 'sc around'));
    const wrong = [
      { ...kettleHolder(), pieces: [] },
      { ...kettleHolder(), title: ' ' },
      { ...kettleHolder(), ownerId: randomUUID() },
      {
        ...kettleHolder(),
        pieces: ['A', 'B'].map((name) => ({ name, make: 1, worked: 'spiral', lines: tooMany })),
      },
    ];
    for (const body of wrong) {
      const answer = await send(body);
      expect(answer.status).toBe(422);
      expect((answer.body as { errors: unknown[] }).errors.length).toBeGreaterThan(0);
      expect((await call(home.house.creator, 'get', `patterns/${body.id}`)).status).toBe(404);
    }
  });
});
