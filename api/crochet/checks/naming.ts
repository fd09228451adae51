import { allItems } from '../count/tree-walk.ts';
import { readLine } from '../language/read-line.ts';
import { type Item, type Work } from '../language/tree.ts';
import { stitchOf } from '../stitches.ts';
import { type Check, type CheckChange, finding, listed, many } from './check.ts';
import { refsOf, type Scan, type ScanLine } from './scan.ts';

export const worksIn = (one: ScanLine): Work[] =>
  allItems(one.read?.tree.items ?? []).filter((item): item is Work => item.type === 'work');

const keysOf = (items: readonly Item[]): string =>
  allItems(items)
    .flatMap((item) => (item.type === 'work' ? [item.stitch] : []))
    .join(' ');

/** Lines with a phrase replaced; null where any of them would then be read as another work than is wanted. */
function reworded(
  scan: Scan,
  lines: readonly ScanLine[],
  replace: (text: string) => string,
  wanted: (keys: string) => string,
): CheckChange[] | null {
  const { terms, specialStitches: special = [] } = scan.source;
  const changes: CheckChange[] = [];
  for (const { line, read } of lines) {
    const text = replace(line.text);
    const after = readLine(text, { terms, special, sizes: Math.max(1, scan.source.sizes.length) });
    if (text === line.text || !read || keysOf(after.tree.items) !== wanted(keysOf(read.tree.items))) return null;
    changes.push({ op: 'edit', row: 'line', id: line.id, fields: { text } });
  }
  return changes;
}

/** The round is worked in back or front loops alone, where an invisible decrease has nothing to close. */
const isOneLoop = (one: ScanLine, work: Work): boolean => {
  const loops = work.loops ?? one.read?.tree.loops ?? null;
  return loops === 'back' || loops === 'front';
};

/** Decreases that are called by the bare word in some lines and by their whole name in others. */
export function checkDecreaseNames(scan: Scan): Check[] {
  const bare: ScanLine[] = [];
  const invisible: ScanLine[] = [];
  for (const one of scan.lines) {
    const works = worksIn(one);
    if (works.some((work) => work.stitch === 'dec' && !isOneLoop(one, work))) bare.push(one);
    if (works.some((work) => work.stitch === 'invdec')) invisible.push(one);
  }
  if (bare.length === 0 || invisible.length === 0) return [];
  const changes = reworded(
    scan,
    bare,
    (text) => text.replace(/(?<!inv(?:isible|\.)? ?)\bdec(?:r|rease|reases|s)?\b/giu, 'inv dec'),
    (keys) => keys.replace(/\bdec\b/g, 'invdec'),
  );
  const others = listed(invisible.map(({ ref }) => ref.name));
  return [
    finding(
      'decrease-names',
      `${many(bare.length, 'says', 'say')} dec, ${others} ${many(invisible.length, 'says', 'say')} inv dec.`,
      { refs: refsOf(bare), mend: changes && { words: 'Write inv dec', done: 'All decreases are inv dec', changes } },
    ),
  ];
}

/** How a stitch is called in a line: by its abbreviation or by its whole name. */
interface Called {
  readonly at: ScanLine;
  readonly way: 'short' | 'whole';
}

const escaped = (text: string) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

/** The whole name with its plural, as a word of its own. */
const nameIn = (name: string) =>
  new RegExp(`(?<!(?:half|double|triple|extended|post|reverse|spike) )\\b${escaped(name)}(?:e?s)?\\b`, 'giu');

/** Stitches that are abbreviated in most lines and written out in some, or the other way round. */
export function checkStitchSpelling(scan: Scan): Check[] {
  const side = scan.source.terms === 'US' ? 'us' : 'uk';
  const called = new Map<string, Called[]>();
  for (const at of scan.lines) {
    for (const key of new Set(worksIn(at).map(({ stitch }) => stitch))) {
      const row = stitchOf(key);
      if (!row || row[side][0] === row[side][1]) continue;
      const [abbreviation, name] = row[side];
      const isWhole = nameIn(name).test(at.line.text);
      const isShort = new RegExp(`\\b${escaped(abbreviation)}s?\\b`, 'iu').test(at.line.text);
      if (isWhole === isShort) continue;
      const one: Called = { at, way: isWhole ? 'whole' : 'short' };
      const known = called.get(key);
      if (known) known.push(one);
      else called.set(key, [one]);
    }
  }
  return [...called].flatMap(([key, lines]): Check[] => {
    const whole = lines.filter(({ way }) => way === 'whole');
    const short = lines.filter(({ way }) => way === 'short');
    if (whole.length === 0 || short.length === 0) return [];
    const [abbreviation, name] = stitchOf(key)![side];
    const odd = (whole.length <= short.length ? whole : short).map(({ at }) => at);
    const [from, to] = whole.length <= short.length ? [name, abbreviation] : [abbreviation, name];
    const pattern = from === name ? nameIn(name) : new RegExp(`\\b${escaped(abbreviation)}s?\\b`, 'giu');
    const changes = reworded(
      scan,
      odd,
      (text) => text.replace(pattern, to),
      (keys) => keys,
    );
    return [
      finding('stitch-spelling', `${many(odd.length, 'says', 'say')} ${from}, the other lines ${to}.`, {
        subject: key,
        refs: refsOf(odd),
        mend: changes && { words: `Write ${to}`, done: `${to} in every line`, changes },
      }),
    ];
  });
}
