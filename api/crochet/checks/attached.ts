import { type Check, finding } from './check.ts';
import { isCounted, type Scan, wordsOf } from './scan.ts';

const ATTACHES =
  /\b(?:sew(?:n|ing|s)?|attach(?:ed|es|ing)?|stitch(?:ed)? (?:\w+ ){0,4}(?:on|to|in place)|pin(?:ned)?|join(?:ed|ing)?|fasten(?:ed)? (?:\w+ ){0,4}(?:on|to)|glue[ds]?|knot(?:ted)?|tie[ds]?|crochet(?:ed)? (?:\w+ ){0,4}(?:on|together)|slip(?:ped)? (?:\w+ ){0,3}(?:on|over)|through|together|on top of|(?:put|place|push|set|lay)(?:s|ed|ing)? (?:\w+ ){0,4}(?:on|over|in|into|inside|between))\b/i;
/** In a piece's own lines a join is most often the slip stitch of a round. */
const OWN = /\b(?:sew(?:n|ing)? |attach|stitch (?:it|them|both|the \w+) |pin (?:it|them|both) |glue (?:it|them|both))/i;

/** "Ear", "Back legs", "Foot" as it stands in a sentence, one or several. */
function nameWords(name: string): RegExp | null {
  const last = /([\p{L}]+)\P{L}*$/u.exec(name.toLowerCase())?.[1];
  if (!last) return null;
  const several: Readonly<Record<string, string>> = {
    foot: 'feet',
    feet: 'foot',
    tooth: 'teeth',
    leaf: 'leaves',
    leaves: 'leaf',
  };
  const stem = last.replace(/(?<=[^s])s$/, '');
  return new RegExp(`\\b(?:${[stem, several[stem] ?? several[last]].filter(Boolean).join('|')})(?:e?s)?\\b`, 'iu');
}

/** Pieces made more than once that no line, step or note puts anywhere. */
export function checkAttached(scan: Scan): Check[] {
  if (scan.pieces.length < 2) return [];
  const notes = scan.source.notes.map(({ text }) => text);
  return scan.pieces.flatMap(({ piece, ref }): Check[] => {
    const name = piece.make > 1 ? nameWords(piece.name) : null;
    if (!name) return [];
    const isAttached =
      notes.some((text) => name.test(text) && ATTACHES.test(text)) ||
      scan.lines.some((one) => {
        const text = wordsOf(one);
        if (one.piece.id === piece.id) return OWN.test(text);
        return name.test(text) && (ATTACHES.test(text) || isCounted(one.line));
      });
    if (isAttached) return [];
    const times = piece.make === 2 ? 'twice' : `${piece.make} times`;
    return [
      finding(
        'never-attached',
        `is made ${times}. Nothing says where the ${piece.make === 2 ? 'two' : String(piece.make)} go.`,
        {
          subject: piece.id,
          refs: [ref],
        },
      ),
    ];
  });
}
