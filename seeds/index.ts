import { publishEdition, readPublishDesk } from '../api/features/editions/publish.service.ts';
import { readPattern } from '../api/features/patterns/document.service.ts';
import { createPattern, stepPattern, type Step } from '../api/features/patterns/patterns.service.ts';
import { editRow } from '../api/features/patterns/rows.service.ts';
import type { Person } from '../api/http/session.ts';
import { addAudit } from '../api/platform/audit.ts';
import type { Deps } from '../api/platform/deps.ts';
import { withRecordingJobs } from './jobs.ts';
import { FLAT_SCARF } from './patterns/flat-scarf.ts';
import { HARVEST_MOUSE } from './patterns/harvest-mouse.ts';
import { KETTLE_HOLDER } from './patterns/kettle-holder.ts';
import { OVAL_BASKET } from './patterns/oval-basket.ts';
import { BOOKMARK_TRIAL, CURTAIN_TIE, PLUM_PINCUSHION } from './patterns/small-ones.ts';
import { seedStudio, type Loft } from './studio.ts';
import { lineOf, rewrite, writePattern, type Hand } from './write-pattern.ts';

export { SIGN_INS } from './sign-ins.ts';

const DAY_MS = 86_400_000;
const BOLETE = '6b1f0a52-3c8e-4d0b-9a41-5f7c2e8d1a08';

type Visibility = 'private' | 'unlisted' | 'listed';

async function publish(deps: Deps, hand: Hand, patternId: string, visibility: Visibility, why: readonly string[] = []) {
  const { lastChange } = await readPublishDesk(deps.db, hand.who, patternId);
  const errata = why.map((reason, index) => ({ index, told: true, why: reason }));
  await publishEdition(deps.db, hand, { patternId, lastChange }, { visibility, errata });
}

async function step(deps: Deps, hand: Hand, patternId: string, to: Step): Promise<void> {
  const { version } = await readPattern(deps.db, hand.who, patternId);
  await stepPattern(deps.db, hand, { id: patternId, version }, to);
}

/** The demo's patterns by their ids, each written by one hand after another; a later hand is nearer to today. */
function patterns(deps: Deps, { studioId, ismay, odile, corin }: Loft) {
  const daysAgo = (who: Person, days: number): Hand => ({
    who,
    now: new Date(deps.clock.now().getTime() - days * DAY_MS),
  });

  return {
    /** Edition 1 is out; for edition 2 its maker goes by the film again: vague once, a slip, and one that runs out. */
    async [HARVEST_MOUSE.id]() {
      const { id } = HARVEST_MOUSE;
      await writePattern(deps, daysAgo(ismay, 12), studioId, HARVEST_MOUSE);
      await publish(deps, daysAgo(ismay, 9), id, 'unlisted');
      const now = daysAgo(ismay, 0);
      await step(deps, now, id, 'drafting');
      await rewrite(deps, now, id, ['Body', 'R9'], { text: '2 sc, inv dec, and so on, tapering as you like' });
      await rewrite(deps, now, id, ['Body', 'R11'], { spokenSlip: null, putAsideReason: null });
      await rewrite(deps, now, id, ['Body', 'R14'], { text: '(3 sc, dec) ×6' });
    },

    /** Two editions; the second puts right what was too short and could be read two ways. */
    async [KETTLE_HOLDER.id]() {
      const { id } = KETTLE_HOLDER;
      await writePattern(deps, daysAgo(ismay, 30), studioId, KETTLE_HOLDER);
      await publish(deps, daysAgo(ismay, 24), id, 'listed');
      const hand = daysAgo(ismay, 4);
      const { lines } = await readPattern(deps.db, ismay, id);
      const mend = async (starts: string, text: string) => {
        const line = lines.find((one) => one.text.startsWith(starts));
        if (!line) throw new Error(`no line begins with “${starts}”`);
        await editRow(deps.db, hand, 'line', { id: line.id, version: line.version }, { text });
      };
      await mend('Lay both', 'Lay both hexagons together, wrong sides inside.');
      await mend('ch 10', 'ch 12, sl st in the first sc, for a loop to hang it by.');
      await publish(deps, hand, id, 'listed', ['It could be read two ways.', 'Ten chains are too short for a peg.']);
    },

    /** With the editor, who has mended one wording already. */
    async [OVAL_BASKET.id]() {
      const { id } = OVAL_BASKET;
      await writePattern(deps, daysAgo(odile, 6), studioId, OVAL_BASKET);
      await step(deps, daysAgo(odile, 3), id, 'in-proof');
      const hand = daysAgo(corin, 1);
      const line = await lineOf(deps, corin, id, 'Basket', 'R11');
      const at = { id: line.id, version: line.version };
      await editRow(deps.db, hand, 'line', at, { note: 'The two chains are the handles: keep them loose.' });
    },

    async [FLAT_SCARF.id]() {
      await writePattern(deps, daysAgo(ismay, 2), studioId, FLAT_SCARF);
    },

    async [PLUM_PINCUSHION.id]() {
      await writePattern(deps, daysAgo(odile, 45), studioId, PLUM_PINCUSHION);
      await publish(deps, daysAgo(odile, 40), PLUM_PINCUSHION.id, 'listed');
    },

    /** Begun: a title and nothing else. */
    async [BOLETE]() {
      await createPattern(deps.db, daysAgo(ismay, 1), { id: BOLETE, studioId, title: 'Bolete' });
    },

    async [CURTAIN_TIE.id]() {
      await writePattern(deps, daysAgo(odile, 90), studioId, CURTAIN_TIE);
      await step(deps, daysAgo(odile, 60), CURTAIN_TIE.id, 'archive');
    },

    async [BOOKMARK_TRIAL.id]() {
      await writePattern(deps, daysAgo(odile, 20), studioId, BOOKMARK_TRIAL);
      await step(deps, daysAgo(odile, 10), BOOKMARK_TRIAL.id, 'bin');
    },
  };
}

const DONE = 'demo-put-in';

/**
 * Puts the demo in: the studio, its people and patterns, made through the services that people use. What is in already
 * is left as it is, whatever has been done with it since; a pattern that was interrupted half-way begins anew.
 */
export async function seed(deps: Deps): Promise<void> {
  const loft = await seedStudio(deps);
  const done = await deps
    .db<{ target: string }>('audit')
    .where({ what: DONE } as never)
    .select('target');
  const isDone = new Set(done.map(({ target }) => target));
  const wanted = Object.entries(patterns(deps, loft)).filter(([id]) => !isDone.has(id));
  if (wanted.length === 0) return;
  await withRecordingJobs(deps, async () => {
    for (const [id, write] of wanted) {
      await clearHalf(deps, id);
      await write();
      await addAudit(deps.db, { personId: loft.ismay.id, what: DONE, target: id });
    }
  });
}

/** Takes out what an interrupted run left of a pattern; the sweep then finds what nobody owns in storage. */
async function clearHalf(deps: Deps, id: string): Promise<void> {
  await deps
    .db('recordings')
    .whereIn('id', deps.db('pattern_recordings').where({ pattern_id: id }).select('recording_id'))
    .delete();
  await deps.db('patterns').where({ id }).delete();
}
