import { stitchOf } from '../stitches.ts';
import { ownForms } from '../language/special.ts';
import { type Check, finding, listed, many } from './check.ts';
import { worksIn } from './naming.ts';
import { refsOf, type Scan, type ScanLine } from './scan.ts';

/** Shorthand of the trade that the list of stitches, loops and places used does not explain. */
const SHORTHAND: readonly (readonly [short: string, words: RegExp, meaning: string])[] = [
  ['MR', /\bMR\b/i, 'magic ring'],
  ['RS', /\bRS\b/, 'right side'],
  ['WS', /\bWS\b/, 'wrong side'],
  ['MC', /\bMC\b/, 'main colour'],
  ['CC', /\bCC\b/, 'contrast colour'],
  ['pm', /\bpm\b/, 'place marker'],
  ['tch', /\bt-?ch\b/i, 'turning chain'],
  ['tbl', /\btbl\b/i, 'through the back loop'],
  ['FO', /\bFO\b/, 'fasten off'],
  ['foll', /\bfoll\b/i, 'following'],
  ['alt', /\balt\b/i, 'alternate'],
  ['rem', /\brem\b/i, 'remaining'],
  ['tog', /(?<![a-z\d])tog\b/i, 'together'],
];

/** Shorthand in the lines that neither the list of stitches nor a note explains. One note explains all of it. */
export function checkAbbreviations(scan: Scan): Check[] {
  const explained = [
    ...scan.source.notes.map(({ text }) => text),
    ...(scan.source.specialStitches ?? []).map(
      ({ name, abbreviation = '', text }) => `${name} ${abbreviation} ${text}`,
    ),
  ].join('\n');
  const used = SHORTHAND.flatMap(([short, words, meaning]) => {
    if (words.test(explained)) return [];
    const lines = scan.lines.filter(({ line }) => words.test(line.text));
    return lines.length > 0 ? [{ short, meaning, lines }] : [];
  });
  if (used.length === 0) return [];
  const using = new Set(used.flatMap((one) => one.lines));
  const lines = scan.lines.filter((line) => using.has(line));
  const names = used.map(({ short }) => short);
  const text = `${used.map(({ short, meaning }) => `${short}: ${meaning}`).join('; ')}.`;
  return [
    finding(
      'abbreviation-unexplained',
      `${many(lines.length, 'uses', 'use')} ${listed(names)}; ${many(names.length, 'it is', 'they are')} not in the abbreviations.`,
      {
        refs: refsOf(lines),
        mend: {
          words: many(names.length, 'Add it', 'Add them'),
          done: `Added to the notes: ${text}`,
          changes: [{ op: 'add', row: 'note', fields: { text } }],
        },
      },
    ),
  ];
}

/** Clusters, shells and their like are worked in as many ways as there are makers: each needs its own words. */
export function checkUnexplainedStitches(scan: Scan): Check[] {
  const own = new Set(ownForms(scan.source.specialStitches ?? [], scan.source.terms).map(([, key]) => key));
  const lines = new Map<string, ScanLine[]>();
  for (const one of scan.lines) {
    for (const { stitch } of worksIn(one)) {
      const row = stitchOf(stitch);
      if (!row || own.has(stitch) || (row.family !== 'bunch' && row.family !== 'group')) continue;
      const at = lines.get(stitch);
      if (!at) lines.set(stitch, [one]);
      else if (at.at(-1) !== one) at.push(one);
    }
  }
  return [...lines].map(([stitch, at]) => {
    const name = stitchOf(stitch)![scan.source.terms === 'US' ? 'us' : 'uk'][1];
    return finding('stitch-unexplained', `${many(at.length, 'works', 'work')} a ${name}; no special stitch says how.`, {
      subject: stitch,
      refs: refsOf(at),
      place: 'sheet',
    });
  });
}
