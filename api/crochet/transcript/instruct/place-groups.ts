import { type Unit } from '../work/units.ts';
import { BARE } from './event.ts';
import { type Letters } from './letters.ts';

const MOST_PARTS = 24;
/** How far before a group the place that it stands in may be named. */
const PLACE_BEFORE = /(?:(?<!N)Z|I[XLOM]*M[XLOM]*G)[^.|NSPDC]{0,9}$/;
const PLACE_AFTER = /m?[,&]*E?o?(?:I[XLOME]*N?Z|I[XLO]*M[XLO]*G|I?E?M|IN(?=[.,|&]|$)|IM)/y;
/** A single place named after stitches that have names: "in the next stitch". */
const STITCH_AFTER = /m?[,&]*I[XLOM]+G/y;
const BACK = 14;

/** Stitches and chains that stand in one place: `three, chain two, three in the corner`, with the letters they take. */
export interface PlaceGroup {
  readonly unit: Unit;
  readonly length: number;
  /** Only told what it is: `a corner is double, chain one, double`. */
  readonly isDefined: boolean;
}

/**
 * Reads stitches around one chain or several as a group in one place, where the place is named before or after it.
 * The stitches may go without their name: `in the space, two, chain two, two`.
 */
export function placeGroupAt(letters: Letters, i: number): PlaceGroup | null {
  if (!'NS'.includes(letters.text[i]!)) return null;
  const { text } = letters;
  const before = PLACE_BEFORE.test(text.slice(Math.max(0, i - BACK), i));
  const whole = partsFrom(letters, i, MOST_PARTS);
  if (whole === null) return null;
  // of a longer list only the first lot stands in the place, unless all of it is said to
  const isOne = whole.chains === 1 || placeBehind(text, whole.end).includes('M');
  const run = isOne ? whole : partsFrom(letters, i, 1);
  if (run === null) return null;
  const after = placeBehind(text, run.end);
  STITCH_AFTER.lastIndex = run.end;
  const named = run.isNamed && after === '' && run.chains === 1 ? (STITCH_AFTER.exec(text)?.[0] ?? '') : '';
  if (!before && after === '' && named === '') return null;
  return {
    unit: { type: 'oneplace', parts: run.parts, times: 1 },
    length: run.end + after.length + named.length - i,
    isDefined: isDefined(letters, i),
  };
}

/** `the corner is …`, `a corner's …`: right behind its name. */
function isDefined({ text, at, source }: Letters, i: number): boolean {
  const name = text.slice(Math.max(0, i - 3), i).lastIndexOf('Z');
  if (name < 0) return false;
  const after = source[at[Math.max(0, i - 3) + name]! + 1];
  return /^(?:is|'s|means|meaning)$/.test(after?.text ?? '');
}

interface Run {
  readonly parts: readonly string[];
  readonly end: number;
  readonly chains: number;
  readonly isNamed: boolean;
}

function placeBehind(text: string, end: number): string {
  PLACE_AFTER.lastIndex = end;
  return PLACE_AFTER.exec(text)?.[0] ?? '';
}

function partsFrom(letters: Letters, from: number, mostChains: number): Run | null {
  const { text, tokens } = letters;
  const valueAt = (i: number) => Math.min(12, Number(tokens[i]!.value));
  const parts: string[] = [];
  let chains = 0;
  let stitches = 0;
  let isNamed = true;
  let i = from;
  let end = from;
  while (parts.length < MOST_PARTS && !(chains === mostChains && stitches > chains)) {
    while (i > from && ',&mE'.includes(text[i] ?? '.')) i += 1;
    const wantsChain = stitches > chains;
    const part = wantsChain ? chainAt(text, i) : stitchAt(text, i);
    if (part === null) break;
    const many = part.number === null ? 1 : valueAt(part.number);
    const name = wantsChain ? 'ch' : part.stitch === null ? BARE : String(tokens[part.stitch]!.value);
    if (name === BARE) isNamed = false;
    for (let n = 0; n < many; n++) parts.push(name);
    if (wantsChain) chains += 1;
    else {
      stitches += 1;
      end = part.end;
    }
    i = part.end;
  }
  if (chains === stitches) {
    while (parts.at(-1) === 'ch') parts.pop();
    chains -= 1;
  }
  return chains < 1 || parts.length > MOST_PARTS ? null : { parts, end, chains, isNamed };
}

interface Part {
  readonly number: number | null;
  readonly stitch: number | null;
  readonly end: number;
}

function stitchAt(text: string, i: number): Part | null {
  if (text[i] === 'S') return { number: null, stitch: i, end: i + 1 };
  if (text[i] !== 'N') return null;
  if (text[i + 1] === 'S') return /[tT]/.test(text[i + 2] ?? '') ? null : { number: i, stitch: i + 1, end: i + 2 };
  return /[tTPDGoUZ]/.test(text[i + 1] ?? '.') ? null : { number: i, stitch: null, end: i + 1 };
}

/** `chain two`, `two chain`, or a bare chain; `chain two two` is a chain of two and two more. */
function chainAt(text: string, i: number): Part | null {
  if (text[i] === 'C' && text[i + 1] === 'N' && text[i + 2] !== 'S') return { number: i + 1, stitch: null, end: i + 2 };
  if (text[i] === 'N' && text[i + 1] === 'C') return { number: i, stitch: null, end: i + 2 };
  return text[i] === 'C' ? { number: null, stitch: null, end: i + 1 } : null;
}
