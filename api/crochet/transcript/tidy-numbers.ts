import { type Token } from './tokens.ts';

/** Takes out numbers that were only counted aloud, added up or taken back, so that those left each mean something. */
export function tidyNumbers(tokens: readonly Token[]): readonly Token[] {
  return withCorrections(withoutSums(withoutCounting(tokens)));
}

/** `two, four, six … twelve` and `one, two, three, four` are counting aloud: what counts is the number reached. */
function withoutCounting(tokens: readonly Token[]): readonly Token[] {
  const out: Token[] = [];
  for (let at = 0; at < tokens.length;) {
    const length = countingLength(tokens, at);
    if (length === 0) {
      out.push(tokens[at]!);
      at += 1;
      continue;
    }
    const last = tokens[at + length - 1]!;
    out.push({
      ...last,
      first: tokens[at]!.first,
      text: Number(tokens[at]!.value) > 1 ? 'counted by steps' : 'counted',
    });
    at += length;
  }
  return out;
}

/** How many tokens a run of counting takes: three numbers or more in equal steps that begin with the step. */
function countingLength(tokens: readonly Token[], at: number): number {
  const first = tokens[at]!;
  if (first.kind !== 'N' || tokens[at - 1]?.kind === 'U' || tokens[at - 1]?.kind === '#') return 0;
  const step = Number(first.value);
  let reached = step;
  let end = at + 1;
  for (;;) {
    const next = tokens[end]?.kind === ',' ? end + 1 : end;
    if (tokens[next]?.kind !== 'N' || Number(tokens[next].value) !== reached + step) break;
    reached += step;
    end = next + 1;
  }
  const many = reached / step;
  // "one, two, picot" is work; three counted and then a pause is counting
  const goesOn = 'SPDUGt'.includes(tokens[end]?.kind ?? '.');
  return step > 0 && step < 11 && many >= (step === 1 && goesOn ? 4 : 3) ? end - at : 0;
}

/** `five plus seven plus 24 is 36`, `thirty two plus six, so thirty eight`: of a sum that is told only its result counts. */
function withoutSums(tokens: readonly Token[]): readonly Token[] {
  const out: Token[] = [];
  for (let at = 0; at < tokens.length;) {
    const result = resultOfSum(tokens, at);
    at = result ?? at;
    out.push(tokens[at]!);
    at += 1;
  }
  return out;
}

function resultOfSum(tokens: readonly Token[], at: number): number | null {
  if (tokens[at]!.kind !== 'N' || tokens[at + 1]?.text !== 'plus') return null;
  let end = at;
  while (tokens[end + 1]?.text === 'plus' && tokens[end + 2]?.kind === 'N') end += 2;
  for (let i = end + 1; i < Math.min(tokens.length, end + 5); i++) {
    if (tokens[i]!.kind === 'N') return i;
    if (!'=v,~a&.'.includes(tokens[i]!.kind)) return null;
  }
  return null;
}

/** `two singles, no, one single`, `wait, no,`: a lone no between commas takes back what was said before it. */
function withCorrections(tokens: readonly Token[]): readonly Token[] {
  return tokens.map((token, i) => {
    const isLone = token.text === 'no' && tokens[i - 1]?.kind === ',' && tokens[i + 1]?.kind === ',';
    const isWait = /^(?:wait|hang)$/.test(token.text) && [',', '.', '&', '~'].includes(tokens[i - 1]?.kind ?? '.');
    return isLone || (isWait && isTaking(tokens, i)) ? { ...token, kind: 'Y' } : token;
  });
}

/** Whether a number or work follows soon, which replaces what was said. */
function isTaking(tokens: readonly Token[], i: number): boolean {
  return tokens.slice(i + 1, i + 6).some((token) => 'NSPD'.includes(token.kind));
}
