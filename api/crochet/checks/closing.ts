import { type Check, finding, many } from './check.ts';
import { isCounted, refsOf, type Scan, type ScanLine, wordsOf } from './scan.ts';
import { names, THINGS } from './things.ts';

const CLOSES =
  /\b(?:(?:pull|draw|cinch|gather)(?:s|n|ed|ing)? (?!(?:the |your )?(?:magic )?(?:ring|loop|tail|yarn)\b)(?:[\w’' ]{0,40}? )?(?:shut|closed|tight|together)|(?:close|sew|stitch) (?:[\w’' ]{0,24}?)?(?:shut|closed|up|(?:the |last )?(?:hole|opening|gap))|cinch(?:ed)?(?: it)?\b)/i;
const FILLING = THINGS.find(({ kind }) => kind === 'filling')!;
const INSIDE =
  /\b(?:insert|put|set|place|push|fix|attach)(?:s|ed|ing)? (?:[\w’' ]{0,30})?(?:safety|toy|plastic)[- ](?:eyes?|nos(?:e|es))\b|\b(?:insert|put|place|slip|knot|tie)(?:s|ed|ing)? (?:[\w’' ]{0,40})?\binside\b|\b(?:insert|put) (?:in )?(?:the |a |your )?(?:bells?|rattles?|squeakers?|wires?|pellets|magnets?)\b/i;

const isInside = (one: ScanLine): boolean => {
  const text = wordsOf(one);
  return names(text, FILLING.words) || names(text, INSIDE);
};

/** Stuffing, eyes and whatever else goes inside, told after the piece is closed. The deed puts it before. */
export function checkClosing(scan: Scan): Check[] {
  return scan.pieces.flatMap(({ piece, lines }): Check[] => {
    const last = lines.findLastIndex(({ line }) => isCounted(line));
    const at = lines.findIndex((one, i) => i >= last && CLOSES.test(wordsOf(one)));
    const closing = lines[at];
    if (!closing) return [];
    const late = lines.slice(at + 1).filter(isInside);
    if (late.length === 0) return [];
    // The round that closes and the words that shut it belong together: what goes inside comes before both.
    let after: string | null = lines[at - 1]?.line.id ?? null;
    return [
      finding(
        'inside-after-closing',
        `${many(late.length, 'comes', 'come')} after ${closing.ref.name} closes the piece, and has to be done before.`,
        {
          subject: piece.id,
          refs: refsOf(late),
          mend: {
            words: many(late.length, 'Put it before', 'Put them before'),
            done: `${many(late.length, 'Step', 'Steps')} put before the piece closes`,
            changes: late.map(({ line }) => {
              const fields = { after };
              after = line.id;
              return { op: 'edit', row: 'line', id: line.id, fields };
            }),
          },
        },
      ),
    ];
  });
}
