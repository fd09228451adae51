/** Every kind of finding, worst first: the list is worked through in this order. The last ones are advice. */
export const CHECK_KINDS = [
  'total-wrong',
  'number-doubled',
  'number-order',
  'range-overlaps',
  'number-missing',
  'repeat-end',
  'inside-after-closing',
  'never-attached',
  'terms-mixed',
  'material-missing',
  'colour-missing',
  'caution-use',
  'caution-reworded',
  'hook-missing',
  'weight-missing',
  'size-missing',
  'stitch-unexplained',
  'abbreviation-unexplained',
  'decrease-names',
  'stitch-spelling',
  'total-missing',
  'total-brackets',
  'material-unused',
  'mark-beyond',
  'mark-order',
  'mark-missing',
  'chapter-short',
  'ruffles',
  'gathers',
  'cups',
  'gauge-missing',
  'level-missing',
  'long-line',
] as const;
export type CheckKind = (typeof CHECK_KINDS)[number];

const ADVICE: ReadonlySet<CheckKind> = new Set([
  'ruffles',
  'gathers',
  'cups',
  'gauge-missing',
  'level-missing',
  'long-line',
]);

/** What a finding is about: a line, or else a piece. */
export interface CheckRef {
  readonly lineId: string | null;
  readonly pieceId: string | null;
  /** As a reader knows it: "R4", "Ear R2", "Tail". */
  readonly name: string;
}

type Fields = Readonly<Record<string, unknown>>;
/** Rows of a pattern that a mend writes to, by the names they have in the change log. */
type MendedRow = 'line' | 'mark' | 'material' | 'caution' | 'note';

/** One typed edit of a mend, in the fields that the pattern's rows have. */
export type CheckChange =
  | { readonly op: 'edit'; readonly row: MendedRow; readonly id: string; readonly fields: Fields }
  | { readonly op: 'add'; readonly row: MendedRow; readonly fields: Fields }
  | { readonly op: 'remove'; readonly row: MendedRow; readonly id: string }
  | { readonly op: 'edit-pattern'; readonly fields: Fields };

/** A deed that settles a finding in all its lines at once. */
export interface Mend {
  /** What the button says: "Make it (24)". */
  readonly words: string;
  /** What was done, afterwards: "All totals stand in ( )". */
  readonly done: string;
  readonly changes: readonly CheckChange[];
}

/** One finding over a whole pattern. One kind of finding about one thing is one check, however many lines it is in. */
export interface Check {
  readonly kind: CheckKind;
  /** With `kind` the check's name, which stays while its lines and figures change; empty where the kind is enough. */
  readonly subject: string;
  /** Off for toys until asked for, and never in the way of anything. */
  readonly isAdvice: boolean;
  readonly refs: readonly CheckRef[];
  /** What follows the names of `refs`: "gives its total in [ ], the others in ( )." Whole where there are none. */
  readonly sentence: string;
  readonly mend: Mend | null;
  /** Where it is mended by hand: at its lines, or among what the sheet prints beside them. */
  readonly place: 'lines' | 'sheet';
  /** Changes with anything that the check says, so that one that was left comes back. */
  readonly says: string;
}

const PRIME = 16_777_619;

/** FNV-1a over UTF-16 units, twice with two seeds: 16 hexadecimal digits. For telling texts apart, not for secrets. */
function digest(text: string): string {
  return [2_166_136_261, 3_735_928_559]
    .map((seed) => {
      let hash = seed;
      for (let i = 0; i < text.length; i += 1) hash = Math.imul(hash ^ text.charCodeAt(i), PRIME);
      return (hash >>> 0).toString(16).padStart(8, '0');
    })
    .join('');
}

/** Puts a finding together; what is not given is empty. */
export function finding(
  kind: CheckKind,
  sentence: string,
  more: {
    readonly refs?: readonly CheckRef[];
    readonly subject?: string;
    readonly mend?: Mend | null;
    readonly place?: Check['place'];
  } = {},
): Check {
  const { refs = [], subject = '', mend = null, place = 'lines' } = more;
  const said = [kind, ...refs.map(({ name }) => name), sentence].join('\n');
  return { kind, subject, isAdvice: ADVICE.has(kind), refs, sentence, mend, place, says: digest(said) };
}

/** The verb or noun that goes with so many. */
export const many = (n: number, one: string, several: string): string => (n === 1 ? one : several);

/** "R5", "R5 and R9", "R5, R7 and R9". */
export function listed(names: readonly string[]): string {
  const [last = '', ...others] = [...names].reverse();
  return others.length === 0 ? last : `${others.reverse().join(', ')} and ${last}`;
}
