import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Pattern } from '#contract/patterns';
import type { BenchApi } from '../../web/features/bench/data/bench-api.ts';
import { BenchStore } from '../../web/features/bench/data/bench-store.ts';
import { keepDrafts } from '../../web/features/bench/data/kept-drafts.ts';
import type { Pending } from '../../web/features/bench/data/pending.ts';
import type { AnyRow } from '../../web/features/bench/data/row-lists.ts';
import { ProblemError, UnreachableError } from '../../web/lib/http.ts';

const uuid = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const [PATTERN, ME, BODY] = [uuid(1), uuid(2), uuid(3)];

const aLine = (n: number, text: string): Pattern['lines'][number] => ({
  id: uuid(100 + n),
  shortId: `s${n}`,
  pieceId: BODY,
  orderKey: `a${n}`,
  kind: 'round',
  label: `R${n}`,
  from: n,
  to: n,
  text,
  note: '',
  written: null,
  said: null,
  heardTotal: null,
  filmed: true,
  putAsideReason: null,
  spokenSlip: null,
  version: 1,
});

const aPattern = (): Pattern => ({
  id: PATTERN,
  studioId: uuid(9),
  studioName: 'Ninepin Loft',
  me: { id: ME, name: 'Ismay T.' },
  code: 'k7mq2rxw',
  title: 'Harvest mouse',
  state: 'drafting',
  visibility: 'private',
  terms: 'US',
  sizes: [],
  details: {
    introduction: '',
    gauge: '',
    finishedSize: '',
    level: null,
    care: '',
    madeBy: '',
    checkedBy: '',
    permission: '',
    contact: '',
    uses: [],
  },
  touchedAt: '2026-03-01T10:00:00.000Z',
  archivedAt: null,
  binnedAt: null,
  version: 1,
  mayEdit: true,
  mayManage: true,
  lastChange: 10,
  mayUndo: false,
  mayRedo: false,
  pieces: [{ id: BODY, orderKey: 'a0', name: 'Body', make: 1, worked: 'spiral', startsOnLineId: null, version: 1 }],
  lines: [aLine(1, '6 sc in a magic ring (6)'), aLine(2, 'inc around (12)'), aLine(3, '(sc, inc) ×6 (18)')],
  marks: [],
  evidence: [],
  recordings: [],
  materials: [],
  cautions: [],
  notes: [],
  specialStitches: [],
  leftChecks: [],
});

/** A server that keeps rows with versions, and can be made to fail or to answer when told. */
function fakeServer(pattern: Pattern) {
  const rows = new Map<string, AnyRow>(
    [...pattern.lines, ...pattern.pieces].map((row) => [row.id, row as unknown as AnyRow]),
  );
  rows.set(PATTERN, pattern);
  const sent: Pending[] = [];
  let fails: (() => Error)[] = [];
  const api: BenchApi = {
    read: () => Promise.resolve({ ...pattern, lastChange: 99 }),
    undo: () => Promise.resolve({ deedId: uuid(50), undoesDeedId: uuid(51), rows: [] }),
    write: (entry) => {
      sent.push(entry);
      const fail = fails.shift();
      if (fail) return Promise.reject(fail());
      const row = rows.get(entry.id);
      if (entry.op === 'create') {
        const made = { orderKey: 'z0', shortId: 'new', ...entry.fields, id: entry.id, version: 1 } as AnyRow;
        rows.set(entry.id, made);
        return Promise.resolve(made);
      }
      if (!row) return Promise.reject(problem(404, {}));
      if (row.version !== entry.baseVersion) {
        const extra = { present: row, savedBy: 'Corin H.', savedAt: '2026-03-01T11:42:00.000Z' };
        return Promise.reject(problem(412, extra));
      }
      if (entry.op === 'remove') {
        rows.delete(entry.id);
        return Promise.resolve(null);
      }
      const saved: AnyRow = { ...row, ...entry.fields, version: row.version + 1 };
      rows.set(entry.id, saved);
      return Promise.resolve(saved);
    },
  };
  return {
    api,
    sent,
    failNext: (...errors: (() => Error)[]) => (fails = errors),
    /** Somebody else saves. */
    saveElsewhere(id: string, fields: Record<string, unknown>) {
      const row = rows.get(id)!;
      rows.set(id, { ...row, ...fields, version: row.version + 1 });
    },
    removeElsewhere: (id: string) => rows.delete(id),
    row: (id: string) => rows.get(id),
  };
}

const problem = (status: number, extra: Record<string, unknown>) =>
  new ProblemError({ type: `/problems/x${status}`, title: 'No', status, ...extra });

function open(pattern = aPattern()) {
  const server = fakeServer(pattern);
  const store = new BenchStore(pattern, {
    api: server.api,
    drafts: keepDrafts(PATTERN, ME),
    now: () => Date.now(),
  });
  const text = (n: number) => store.snapshot().pattern.lines.find((line) => line.id === uuid(100 + n))?.text;
  return { server, store, text };
}

beforeEach(() => {
  vi.useFakeTimers({ now: new Date('2026-03-01T10:42:00') });
  localStorage.clear();
});
afterEach(() => vi.useRealTimers());

describe('saving by itself', () => {
  test('shows at once, counts at once, and sends the word and not its letters', async () => {
    const { server, store, text } = open();
    for (const typed of ['i', 'in', 'inc around (13)']) store.edit('line', uuid(102), { text: typed });
    expect(text(2)).toBe('inc around (13)');
    expect(store.snapshot().lineCounts.get(uuid(102))?.verdict).toBe('differs');
    expect(store.snapshot().save).toMatchObject({ state: 'saving', words: 'Saving' });
    expect(server.sent).toEqual([]);
    await vi.advanceTimersByTimeAsync(1_000);
    expect(server.sent).toHaveLength(1);
    expect(server.sent[0]).toMatchObject({ op: 'edit', baseVersion: 1, fields: { text: 'inc around (13)' } });
    expect(store.snapshot().save.words).toBe('Saved 10:42');
  });

  test('what is typed while a save is on its way goes behind it, with the version that it brought', async () => {
    const { server, store } = open();
    store.edit('line', uuid(101), { text: 'one' });
    const first = store.flush();
    store.edit('line', uuid(101), { text: 'one two' });
    await first;
    await vi.advanceTimersByTimeAsync(1_000);
    expect(server.sent.map(({ baseVersion, fields }) => [baseVersion, fields.text])).toEqual([
      [1, 'one'],
      [2, 'one two'],
    ]);
    expect(server.row(uuid(101))).toMatchObject({ text: 'one two', version: 3 });
  });

  test('a line made, written and marked at once is sent in that order', async () => {
    const { server, store } = open();
    const id = store.add('line', { pieceId: BODY, kind: 'round', after: uuid(101) });
    store.edit('line', id, { text: 'sc around' });
    store.add('mark', { lineId: id, recordingId: uuid(70), startMs: 900 });
    expect(store.snapshot().pattern.lines.map((line) => line.id)).toEqual([uuid(101), id, uuid(102), uuid(103)]);
    await vi.advanceTimersByTimeAsync(2_000);
    expect(server.sent.map(({ op, kind }) => `${op} ${kind}`)).toEqual(['create line', 'edit line', 'create mark']);
    expect(server.sent[1]).toMatchObject({ baseVersion: 1, fields: { text: 'sc around' } });
  });

  test('changes in one step carry one deed; steps of their own do not', async () => {
    const { server, store } = open();
    store.asOneDeed(() => {
      store.edit('line', uuid(101), { label: 'R1' });
      store.edit('line', uuid(102), { label: 'R2' });
    });
    store.edit('line', uuid(103), { label: 'R3' });
    await vi.advanceTimersByTimeAsync(2_000);
    const deeds = server.sent.map(({ deedId }) => deedId);
    expect(deeds[0]).toBe(deeds[1]);
    expect(deeds[2]).not.toBe(deeds[0]);
  });

  test('a line made and taken away before it was sent is never sent', async () => {
    const { server, store } = open();
    server.failNext(() => new UnreachableError('down'));
    store.edit('line', uuid(101), { filmed: false });
    await vi.advanceTimersByTimeAsync(10);
    const id = store.add('line', { pieceId: BODY, kind: 'round' });
    store.add('mark', { lineId: id, recordingId: uuid(70), startMs: 0 });
    store.remove('line', id);
    await vi.advanceTimersByTimeAsync(5_000);
    expect(server.sent.map(({ id: sent }) => sent)).toEqual([uuid(101), uuid(101)]);
    expect(store.isIdle()).toBe(true);
  });
});

describe('when it cannot be saved', () => {
  test('a silent server: said so, kept, and tried again with growing waits until it answers', async () => {
    const { server, store, text } = open();
    const down = () => new UnreachableError('down');
    server.failNext(down, down);
    store.edit('line', uuid(101), { text: 'x' });
    await vi.advanceTimersByTimeAsync(700);
    expect(store.snapshot().save).toMatchObject({
      state: 'not-saved',
      words: 'Not saved: The server does not answer. Kept on this device.',
    });
    expect(text(1)).toBe('x');
    await vi.advanceTimersByTimeAsync(2_000);
    expect(server.sent).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(4_000);
    expect(server.row(uuid(101))).toMatchObject({ text: 'x', version: 2 });
    expect(store.snapshot().save.state).toBe('saved');
  });

  test('a reload loses nothing, and what had arrived already is not written twice', async () => {
    const { server, store } = open();
    server.failNext(() => new UnreachableError('down'));
    store.edit('line', uuid(101), { text: 'typed before the reload' });
    store.add('line', { pieceId: BODY, kind: 'step', text: 'Stuff.' });
    await vi.advanceTimersByTimeAsync(900);
    store.close();

    const again = new BenchStore(aPattern(), { api: server.api, drafts: keepDrafts(PATTERN, ME), now: Date.now });
    await again.open();
    expect(again.snapshot().pattern.lines.map((line) => line.text)).toContain('Stuff.');
    await vi.advanceTimersByTimeAsync(5_000);
    expect(server.row(uuid(101))?.text).toBe('typed before the reload');
    expect(again.isIdle()).toBe(true);
    expect(Object.keys(localStorage)).toEqual([]);
  });

  test('what one person left unsaved is not shown to another on the same computer', async () => {
    const { server, store } = open();
    server.failNext(() => new UnreachableError('down'));
    store.edit('line', uuid(101), { text: 'mine' });
    await vi.advanceTimersByTimeAsync(900);
    store.close();
    expect(await keepDrafts(PATTERN, uuid(77)).load()).toEqual([]);
  });

  test('a session that ended: nothing more is tried until somebody signs in again', async () => {
    const { server, store } = open();
    server.failNext(() => problem(401, { detail: 'ended' }));
    store.edit('line', uuid(101), { text: 'x' });
    await vi.advanceTimersByTimeAsync(60_000);
    expect(server.sent).toHaveLength(1);
    expect(store.snapshot().save).toMatchObject({ state: 'not-saved', isSignedOut: true });
    store.retry();
    await vi.advanceTimersByTimeAsync(1_000);
    expect(server.row(uuid(101))?.text).toBe('x');
  });

  test('what the server refuses stays on screen with its reason; writing on tries anew', async () => {
    const { server, store } = open();
    server.failNext(() => problem(422, { detail: 'A mark cannot end before it starts.' }));
    store.edit('line', uuid(101), { text: 'x' });
    await vi.advanceTimersByTimeAsync(900);
    expect(store.snapshot().save.words).toContain('A mark cannot end before it starts.');
    store.edit('line', uuid(101), { text: 'y' });
    await vi.advanceTimersByTimeAsync(900);
    expect(server.row(uuid(101))?.text).toBe('y');
    expect(store.snapshot().save.state).toBe('saved');
  });
});

describe('two people at one line', () => {
  test('both changed the same: both are there, nothing is saved over, other lines go on saving', async () => {
    const { server, store, text } = open();
    server.saveElsewhere(uuid(102), { text: 'theirs' });
    store.edit('line', uuid(102), { text: 'mine' });
    store.edit('line', uuid(103), { text: 'another' });
    await vi.advanceTimersByTimeAsync(2_000);
    const [conflict] = store.snapshot().conflicts;
    expect(conflict).toMatchObject({ rowId: uuid(102), savedBy: 'Corin H.' });
    expect(conflict?.fields).toEqual([
      { field: 'text', base: 'inc around (12)', mine: 'mine', theirs: 'theirs', clashes: true },
    ]);
    expect(text(2)).toBe('mine');
    expect(server.row(uuid(102))?.text).toBe('theirs');
    expect(server.row(uuid(103))?.text).toBe('another');
  });

  test.each([
    ['mine', 'mine'],
    ['theirs', 'theirs'],
    [{ text: 'both of us' }, 'both of us'],
  ])('settled with %j it becomes that', async (how, becomes) => {
    const { server, store, text } = open();
    server.saveElsewhere(uuid(102), { text: 'theirs' });
    store.edit('line', uuid(102), { text: 'mine' });
    await vi.advanceTimersByTimeAsync(1_000);
    store.resolve(store.snapshot().conflicts[0]!.id, how as 'mine');
    await vi.advanceTimersByTimeAsync(1_000);
    expect(server.row(uuid(102))?.text).toBe(becomes);
    expect(text(2)).toBe(becomes);
    expect(store.snapshot().conflicts).toEqual([]);
    expect(store.snapshot().save.state).toBe('saved');
  });

  test('different parts of one line are put together, and it is said', async () => {
    const { server, store } = open();
    server.saveElsewhere(uuid(102), { note: 'firmly' });
    store.edit('line', uuid(102), { text: 'mine' });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(server.row(uuid(102))).toMatchObject({ text: 'mine', note: 'firmly', version: 3 });
    expect(store.snapshot().notices.map(({ words }) => words)).toEqual([
      'Corin H. changed another part of this meanwhile. Both are kept.',
    ]);
  });

  test('of the pattern’s own details each part is for itself', async () => {
    const { server, store } = open();
    server.saveElsewhere(PATTERN, { details: { ...aPattern().details, care: 'By hand.' } });
    store.edit('pattern', PATTERN, { details: { gauge: '20 sts' } });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(store.snapshot().conflicts).toEqual([]);
    expect(server.sent.at(-1)).toMatchObject({ baseVersion: 2, fields: { details: { gauge: '20 sts' } } });
  });

  test('both wrote the same words: that is no clash', async () => {
    const { server, store } = open();
    server.saveElsewhere(uuid(102), { text: 'same' });
    store.edit('line', uuid(102), { text: 'same' });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(store.snapshot().conflicts).toEqual([]);
    expect(store.isIdle()).toBe(true);
  });

  test('they took the line away: one’s own words are kept, and can be put back as a new line', async () => {
    const { server, store } = open();
    server.removeElsewhere(uuid(102));
    store.edit('line', uuid(102), { text: 'mine' });
    await vi.advanceTimersByTimeAsync(1_000);
    expect(store.snapshot().conflicts).toMatchObject([{ rowId: uuid(102), theirs: null }]);
    store.resolve(store.snapshot().conflicts[0]!.id, 'mine');
    await vi.advanceTimersByTimeAsync(1_000);
    expect(server.sent.at(-1)).toMatchObject({ op: 'create', fields: { text: 'mine', pieceId: BODY, label: 'R2' } });
  });

  test('one’s own taking away gives way to what somebody wrote meanwhile', async () => {
    const { server, store, text } = open();
    server.saveElsewhere(uuid(102), { text: 'theirs' });
    store.remove('line', uuid(102));
    expect(text(2)).toBeUndefined();
    await vi.advanceTimersByTimeAsync(1_000);
    expect(text(2)).toBe('theirs');
    expect(store.snapshot().notices).toHaveLength(1);
  });

  test('a newer reading of the whole keeps what is being written', () => {
    const { store, text } = open();
    store.edit('line', uuid(101), { text: 'mine' });
    const newer = aPattern();
    store.receive({ ...newer, lastChange: 11, lines: [newer.lines[0]!, { ...newer.lines[1]!, text: 'theirs' }] });
    expect([text(1), text(2), text(3)]).toEqual(['mine', 'theirs', undefined]);
    store.receive({ ...newer, lastChange: 5 });
    expect(text(2)).toBe('theirs');
  });
});

describe('undo', () => {
  test('waits for what is still to be saved, then reads the whole again', async () => {
    const { server, store } = open();
    store.edit('line', uuid(101), { text: 'x' });
    const outcome = await store.undo('undo');
    expect(server.sent).toHaveLength(1);
    expect(outcome).toEqual({ done: true, rowIds: [] });
    expect(store.snapshot().pattern.lastChange).toBe(99);
  });

  test('refused, it says why and nothing has changed', async () => {
    const { server, store } = open();
    server.api.undo = () => Promise.reject(problem(409, { detail: 'Corin H. has changed this since.' }));
    expect(await store.undo('undo')).toEqual({ done: false, words: 'Corin H. has changed this since.' });
  });

  test('without the server it has to wait', async () => {
    const { server, store } = open();
    server.failNext(() => new UnreachableError('down'));
    store.edit('line', uuid(101), { text: 'x' });
    expect(await store.undo('undo')).toMatchObject({ done: false });
  });
});
