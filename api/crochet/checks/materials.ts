import { type Check, type CheckChange, finding, listed, many } from './check.ts';
import { refsOf, type Scan, wordsOf } from './scan.ts';
import { type CheckMaterial } from './source.ts';
import { names, THINGS, type Thing } from './things.ts';

const textOf = ({ name, details }: CheckMaterial) => [name, details.colour ?? '', details.amount ?? ''].join(' ');

const has = (thing: Thing, materials: readonly CheckMaterial[]): boolean =>
  materials.some((one) => thing.words.test(textOf(one)) || (thing.kind === 'filling' && one.kind === 'filling'));

/** The size that stands before a thing: "9 mm safety eyes". */
const SIZE = /(\d+(?:\.\d+)?) ?(?:mm|millimet(?:re|er)s?)[- ]\D{0,20}$/i;

function added(thing: Thing, words: readonly string[]): CheckChange {
  const sizes = words.flatMap((text) => {
    const found = thing.words.exec(text);
    const size = found && SIZE.exec(`${text.slice(0, found.index)} ${found[0]}`)?.[1];
    return size ? [Number(size)] : [];
  });
  const details = sizes[0] !== undefined && sizes[0] <= 100 ? { sizeMm: sizes[0] } : {};
  return { op: 'add', row: 'material', fields: { kind: thing.kind, name: thing.name, details } };
}

/** Parts and notions that a line names and the materials do not list. */
export function checkMissingMaterials(scan: Scan): Check[] {
  return THINGS.filter((thing) => !has(thing, scan.source.materials)).flatMap((thing): Check[] => {
    const lines = scan.lines.filter((line) => names(wordsOf(line), thing.words));
    if (lines.length === 0) return [];
    const what = thing.name.toLowerCase();
    return [
      finding('material-missing', `${many(lines.length, 'names', 'name')} ${what}, and the materials do not.`, {
        subject: what,
        refs: refsOf(lines),
        mend: {
          words: `Add ${what}`,
          done: `${thing.name} added to the materials`,
          changes: [added(thing, lines.map(wordsOf))],
        },
      }),
    ];
  });
}

/** Parts that the materials list and no line puts anywhere. */
export function checkUnusedMaterials(scan: Scan): Check[] {
  const lines = scan.lines.map(wordsOf).concat(scan.source.notes.map(({ text }) => text));
  const unused = scan.source.materials.filter((material) => {
    const thing = THINGS.find((one) => one.isPart && has(one, [material]));
    if (!thing) return false;
    // A plain "eyes" in a line is what "safety eyes" stand in the materials for.
    const last = thing.name.toLowerCase().split(' ').at(-1)!;
    const bare = new RegExp(`\\b${last.replace(/s$/, '')}`, 'iu');
    return !lines.some((text) => thing.words.test(text) || bare.test(text));
  });
  if (unused.length === 0) return [];
  const what = listed(unused.map(({ name }) => name));
  return [
    finding(
      'material-unused',
      `${what} ${many(unused.length, 'stands', 'stand')} in the materials, and no line says where ${many(unused.length, 'it goes', 'they go')}.`,
      {
        place: 'sheet',
      },
    ),
  ];
}
