import { type Token } from '../tokens.ts';
import { BARE } from './event.ts';
import { type Made, either, isPlural, number, st, stitch, tog, unit } from './made.ts';

export function decName(matched: readonly Token[]): string {
  const value = matched.find((token) => token.kind === 'D')?.value;
  return typeof value === 'string' ? value : BARE;
}

export function repeated(matched: readonly Token[]): Made | null {
  const times = matched.find((token) => token.kind === 't');
  if (times !== undefined && Number(times.value) > 0) return null;
  const n = number(matched);
  return n > 0 ? { type: 'times', n } : null;
}

/** `single crochet in each of the next four`, `half double in seven stitches`; "in one" is a single place. */
export function counted(matched: readonly Token[], letters: string): Made | null {
  if (!/[IE]/.test(letters)) return null;
  const each = matched.find((token) => token.kind === 'E');
  if (each !== undefined && !/[XLO]/.test(letters) && each.text.endsWith(' one')) return null;
  return unit(st(stitch(matched), number(matched)));
}

/** `one single crochet in each of the next four`; `three in one` has that many in one place. */
export function eachInCounted(matched: readonly Token[], letters: string): Made {
  const inEach = number(matched);
  const places = number(matched, 1);
  if (places === 1) return unit(st(stitch(matched), 1, inEach));
  if (letters.includes('E') || inEach === 1) return unit(st(stitch(matched), places, inEach));
  return inEach === places
    ? unit(st(stitch(matched), places))
    : either([st(stitch(matched), places, inEach)], [st(stitch(matched), inEach)]);
}

/** `two in the next`, `two trebles in the same stitch`; where the place is plural, one in each. */
export function inOne(matched: readonly Token[], letters: string): Made | null {
  const many = number(matched);
  const place = matched.at(-1)!;
  if (place.kind === 'I' || (place.kind === 'Z' && !/[XLOMN]/.test(letters.slice(2)) && isPlural(place))) return null;
  if (place.kind === 'G' && isPlural(place) && place.value !== 'loop') return unit(st(stitch(matched), many));
  // "two in the last, forty one again" without its comma
  if (number(matched, 1) > 7 && letters.split('N').length > 2) return null;
  if (many === 1) return unit(st(stitch(matched), 1));
  if (many > 12) return null;
  return either([st(stitch(matched), 1, many)]);
}

/** `a single and a double together`, `a half double, a double and a half double, all in the one stitch`. */
export function unlikeInOne(matched: readonly Token[], letters: string): Made | null {
  if (!/M|EI|EoI|IN|T/.test(letters)) return null;
  // "a slip stitch, three half trebles in one stitch": the place is the last ones' alone
  if (/[,&]NS[,&]?IN/.test(letters)) return null;
  const parts: string[] = [];
  let many = 1;
  for (const token of matched) {
    if (token.kind === 'N') many = Number(token.value);
    if (token.kind !== 'S') continue;
    for (let n = 0; n < Math.min(many, 12); n++) parts.push(String(token.value));
    many = 1;
  }
  if (letters.endsWith('T') && parts.every((part) => part === parts[0])) return null;
  if (parts.every((part) => part === parts[0])) return unit(st(parts[0]!, 1, parts.length));
  return unit({ type: 'oneplace', parts, times: 1 });
}

/** `six singles two together` is six decreases; `four singles, three together` are four stitches and a decrease. */
export function manyTogether(matched: readonly Token[]): Made {
  const apart = [st(stitch(matched), number(matched)), tog(stitch(matched), number(matched, 1))];
  const joined = [tog(stitch(matched), number(matched, 1), number(matched))];
  return isPlural(matched[1]) || number(matched, 1) > 2 ? either(apart, joined) : either(joined, apart);
}

/**
 * `corner, gap, corner, gap`: the same two names in turn say that what was told goes on; with a number, or "plain", for the
 * side they tell the whole of it.
 */
export function inTurn(matched: readonly Token[]): Made | null {
  const told = matched.filter((one) => 'ZFwGN'.includes(one.kind));
  const names = told.map((one) => one.text.replace(/s$/, ''));
  const isInTurn = names.length > 3 && names.every((name, n) => name === names[n % 2]) && names[0] !== names[1];
  if (!isInTurn) return null;
  const side = told[1]!;
  if (told[0]!.value === 'corner' && (side.kind === 'N' || side.kind === 'F')) {
    const many = side.kind === 'N' ? Number(side.value) : 1;
    return { type: 'cycle', items: [null, st(stitch(matched), many)] };
  }
  return told.some((one) => one.kind === 'N') ? null : { type: 'around' };
}

/** `two doubles in the corner with two chain between them`: half on either side. */
export function partedByChain(matched: readonly Token[]): Made | null {
  const chain = matched.findIndex((one) => one.kind === 'C');
  const isParted = matched.some((one) => /^(?:between|in between|part|separate|divide)$/.test(one.text));
  const many = number(matched);
  if (!isParted || many % 2 !== 0 || many > 12) return null;
  const beside = [matched[chain - 1], matched[chain + 1]].find((one) => one?.kind === 'N' && one !== matched[0]);
  const chains = Array.from({ length: Math.min(12, Number(beside?.value ?? 1)) }, () => 'ch');
  const half = Array.from({ length: many / 2 }, () => stitch(matched));
  return unit({ type: 'oneplace', parts: [...half, ...chains, ...half], times: 1 });
}

/** `one in each of the next three`; "two in each, sixteen" and "thirty on all four" are a total and rounds. */
export function inEachOfMany(matched: readonly Token[], letters: string): Made | null {
  const each = matched.find((one) => one.kind === 'E')!;
  const places = matched.findLast((one) => one.kind === 'N')!;
  const isOf = /[XLO]/.test(letters) || places.first > each.last + 1;
  if (!isOf || !/^(?:each|every)/.test(each.text) || number(matched) > 5) return null;
  return unit(st(stitch(matched), number(matched, 1), number(matched)));
}
