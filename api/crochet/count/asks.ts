import { type Item, type LineTree } from '../language/tree.ts';
import { allItems } from './tree-walk.ts';
import { type Judged } from './judge.ts';
import { openChoices, turned, type Choices } from './readings.ts';
import { type Ask } from './result.ts';
import { firstStitch } from './start.ts';

type Key = 'rep' | 'tail' | 'chain';

const KEYS: readonly Key[] = ['rep', 'tail', 'chain'];

/**
 * What to ask the maker, or to tell, about a line whose words can be read in two ways: asked where both ways come out
 * or neither does, told where only the unusual one does. Nothing is said where the two make the same.
 *
 * @param judged the line under the reading taken.
 * @param attempt works the line under another reading.
 */
export function asksOf(tree: LineTree, judged: Judged, usual: Choices, attempt: (choices: Choices) => Judged): Ask[] {
  const asks: Ask[] = [];
  const open = openChoices(tree);
  for (const key of KEYS) {
    if (!open.includes(key) || (key === 'chain' && firstStitch(tree.items) !== 'hdc')) continue;
    const other = attempt(turned(judged.choices, key));
    if (isSame(judged, other)) continue;
    const [fits, otherFits] = [comesOut(judged), comesOut(other)];
    const isUsual = judged.choices[key] === usual[key];
    if (fits !== otherFits && (isUsual || !fits)) continue;
    const taken = wordsOf(key, judged.choices, tree);
    const left = wordsOf(key, other.choices, tree);
    asks.push({
      kind: key,
      text:
        fits === otherFits
          ? `Read as ${taken} (${String(judged.work.tally.sts)}); is ${left} meant (${String(other.work.tally.sts)})?${fits ? '' : ' Neither fits.'}`
          : `Read as ${taken}: only so does it come out.`,
    });
  }
  return [...asks, ...growth(tree, judged), ...invisible(tree)];
}

const comesOut = ({ verdict }: Judged): boolean => verdict === 'agrees' || verdict === 'no-total';

const isSame = (one: Judged, other: Judged): boolean =>
  one.work.tally.sts === other.work.tally.sts &&
  one.work.uses === other.work.uses &&
  one.work.short === other.work.short;

/** A reading in words. */
function wordsOf(key: Key, choices: Choices, tree: LineTree): string {
  if (key === 'chain') {
    const isCounted = choices.chain === 'other';
    return isCounted ? 'the turning chain counted as a stitch' : 'the turning chain not counted';
  }
  if (key === 'tail')
    return choices.tail === 'all' ? 'all of the series repeated' : 'only the last of the series repeated';
  const group = allItems(tree.items).find((item) => item.type === 'group' && item.times.type === 'rep');
  const n = group?.type === 'group' && group.times.type === 'rep' ? (group.times.n[0] ?? 1) : 1;
  return choices.rep === 'all' ? `${String(n)} in all` : `${String(n)} more, ${String(n + 1)} in all`;
}

/** A row that is one short of its total may count its chain and yet pass over nothing. */
function growth(tree: LineTree, judged: Judged): Ask[] {
  const chain = tree.items.find((item) => item.type === 'work');
  const { work, total } = judged;
  const isOneShort = judged.verdict === 'differs' && total === work.tally.sts + 1;
  if (!isOneShort || !work.chainUnsaid || chain?.type !== 'work' || chain.stitch !== 'ch') return [];
  return [
    {
      kind: 'growth',
      text: `${String(total)} comes out if the turning chain counts and no stitch is passed over: each such row grows by one.`,
    },
  ];
}

/** An invisible decrease closes front loops, which a back-loop round leaves alone. */
function invisible(tree: LineTree): Ask[] {
  const isBack = (item: Item): boolean =>
    item.type === 'work' && item.stitch === 'invdec' && (item.loops ?? tree.loops) === 'back';
  return allItems(tree.items).some(isBack)
    ? [
        {
          kind: 'loops',
          text: 'An invisible decrease closes front loops, and this line is worked in the back loops: is a plain decrease meant?',
        },
      ]
    : [];
}
