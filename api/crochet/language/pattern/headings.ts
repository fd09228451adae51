/** A heading that names a piece: `Ears (make 2)`, `BODY`, `Left arm x2:`. */
export interface Heading {
  readonly name: string;
  readonly make: number;
}

const NUMBER: Readonly<Record<string, number>> = {
  one: 1,
  two: 2,
  three: 3,
  four: 4,
  five: 5,
  six: 6,
  seven: 7,
  eight: 8,
  nine: 9,
  ten: 10,
  twelve: 12,
  both: 2,
};

/** Sections in which no line is worked. */
const OUTSIDE =
  /^(materials?|supplies|you(?:'| wi)?ll need|you need|yarns?|hooks?|gauge|tension|sizes?|finished (?:size|measurements?)|measurements|abbreviations?|key|notes?|pattern notes?|stitch(?:es)? (?:used|guide|key|glossary)|skill level|level|difficulty|terms|terminology|tools|equipment|notions|special stitch(?:es)?|techniques?|glossary|copyright|about|introduction|care|assembly|finishing|making up|make up|to make up|sewing|putting together|designer|chart|legend)\b/i;

export type Section = 'special' | 'abbreviations' | 'materials' | 'notes' | 'assembly';

/** The section that a line opens, or null. */
export function sectionOf(line: string): Section | null {
  const words = line.replace(/^[#*\s•\-–]+/, '').trim();
  const match = OUTSIDE.exec(words);
  if (!match) return null;
  const name = match[1]!.toLowerCase();
  const rest = words.slice(match[0].length).trim();
  const isHeading = rest === '' || /^[:–—-]/.test(rest) || /^(used|list|needed|required|key|guide|\()/i.test(rest);
  if (!isHeading) return null;
  if (name.startsWith('special')) return 'special';
  if (/^(abbrev|key|stitch|glossary|terms|legend)/.test(name)) return 'abbreviations';
  if (/^(assembly|finishing|making|make|to make|sewing|putting)/.test(name)) return 'assembly';
  if (/^(note|pattern|copyright|about|intro|care|technique|skill|level|difficulty)/.test(name)) return 'notes';
  return 'materials';
}

/** A short line without work, in capitals, closed by a colon or followed by rounds, names a piece. */
export function headingOf(line: string): Heading | null {
  let words = line.replace(/^[#*_\s•=]+|[*_\s=]+$/g, '').trim();
  if (words.length === 0 || words.length > 60) return null;
  let make = 1;
  const made =
    /[\s,(–—-]*\(?\s*(?:please )?(?:make|x|×|work|crochet)\s*(\d+|one|two|three|four|five|six|seven|eight|nine|ten|twelve|both)(?: of (?:these|them)| pieces?| times)?\s*\)?/i.exec(
      words,
    ) ?? /[\s,(–—-]+\(?(\d+)\s*(?:x|×|pieces?|pcs)\)?\s*$/i.exec(words);
  if (made) {
    make = NUMBER[made[1]!.toLowerCase()] ?? Number(made[1]);
    words = (words.slice(0, made.index) + words.slice(made.index + made[0].length)).trim();
  }
  words = words
    .replace(/\s*\([^()]*\)\s*:?$/, '')
    .replace(/[\s:–—.-]+$/, '')
    .trim();
  if (words === '' || /[.;!?]/.test(words) || /\d{2,}/.test(words) || words.split(/\s+/).length > 6) return null;
  return { name: words, make: make >= 1 && make < 500 ? make : 1 };
}
