import { type Sentences } from '../sentences.ts';
import { type Token } from '../tokens.ts';
import { type Candidate } from './candidate.ts';
import { announcementStart, startsClause } from './candidates.ts';
import { isCounted, readNumberList } from './number-list.ts';

const WORKING = 'SPDFE';

/**
 * A number at the head of a sentence with nothing counted after it may announce the line of that number: `Five, we're
 * back to regular`, `13's easy`, `The tenth is for the ribbon`, `Fourth time around`, `6 to 9 is only sc`.
 */
export function bareCandidates(tokens: readonly Token[], i: number, sentences: Sentences): Candidate[] {
  const token = tokens[i]!;
  if (token.kind !== 'N' && token.kind !== 'O') return [];
  if (token.isGuess || tokens[i - 1]?.kind === 'U' || tokens[i - 1]?.kind === '#') return [];
  const list = readNumberList(tokens, i, true, true);
  if (list === null) return [];
  const next = tokens[list.end];
  const isTime = token.kind === 'O' && next?.kind === 't';
  const isCount = isCounted(tokens, list.end) && !(token.kind === 'O' && next?.text === 'places');
  if (!isTime && (isCount || next?.kind === 'U' || next?.kind === 'E')) return [];
  if (list.from === 1 && !tokens.slice(i, i + 14).some((one) => one.kind === 'V')) return [];
  if (token.kind === 'O' && (Number(token.value) === 1 || next?.kind === 'H' || next?.kind === 'Z')) return [];
  const strength = isTime ? 1.8 : strengthOf(tokens, i, list.end, list.to - list.from + 1, sentences);
  if (strength <= 0) return [];
  const isTail = token.kind === 'O' && '.|'.includes(next?.kind ?? '.') && i - sentences.startOf[i]! < 24;
  const at = isTail ? sentences.startOf[i]! : announcementStart(tokens, i, sentences);
  const base = {
    kind: 'line' as const,
    at,
    end: isTime ? list.end + 1 : list.end,
    mark: i,
    unit: null,
    needs: list.from === 1 ? ('start' as const) : null,
  };
  return [{ ...base, lines: { type: 'named', from: list.from, to: list.to }, strength }];
}

function strengthOf(tokens: readonly Token[], i: number, end: number, many: number, sentences: Sentences): number {
  const next = tokens[end]?.kind ?? '.';
  const before = tokens[i - 1]?.kind ?? '.';
  if (!worksSoon(tokens, end)) return many > 1 ? 0.4 : 0;
  if (isResult(tokens, i)) return 0;
  const isHead = startsClause(tokens, i);
  if (!isHead && !sentences.isPunctuated) return strengthUnmarked(tokens, i, end, many);
  const atSentence = i - sentences.startOf[i]! <= 3;
  if (many > 2) return isHead ? 2 : 1.5;
  if (many === 2) return isHead ? 1.2 : 0.7;
  if (tokens[i]!.kind === 'O') return before === 'p' || !isHead ? 0.3 : 1.4;
  if (!isHead)
    return shortHead(tokens, i, sentences)
      ? 1
      : before === '&' && next === 'v'
        ? 0.9
        : tokens[i - 1]?.text === 'for' && '.,'.includes(next)
          ? 0.6
          : 0;
  if (next === 'v' || next === '=') return atSentence ? 1.3 : 0.9;
  if (next === ',' || next === '.') return atSentence ? 0.9 : 0.6;
  if (next === '&') return 0.2;
  if ('aIw~c'.includes(next)) return atSentence ? 0.7 : 0.4;
  return 0.2;
}

/**
 * Without full stops a number that counts nothing may be a line's where what follows tells of it as of a line: `four is
 * one lap in gold`, `fifteen three and an increase`. It is taken only where the numbers before it lead up to it.
 */
function strengthUnmarked(tokens: readonly Token[], i: number, end: number, many: number): number {
  const before = tokens[i - 1]?.kind ?? '.';
  const next = tokens[end];
  const isJoined = tokens[i - 1]?.text === 'and' && tokens[i - 2]?.kind === 'N';
  if ('pIOXEMrmbCnP'.includes(before) || isJoined || next === undefined) return 0;
  if (many > 1) return many > 2 ? 1.5 : 0.8;
  if (before === '&' && next.kind !== 'v') return 0;
  if (tokens[i]!.kind === 'O') return 0.3;
  if (next.kind === 'v' && /^(?:is|are|'s|goes|gets|has|wants|takes|you|we|you do|we do)$/.test(next.text)) return 0.95;
  const isWork = next.kind === 'N' && '&SPD,w'.includes(tokens[end + 1]?.kind ?? '.');
  if (isWork || (next.kind === 'a' && /^(?:you|we|i)$/.test(next.text))) return 0.8;
  return next.kind === '=' || next.kind === '~' ? 0.55 : 0;
}

/** Whether work is spoken of within the next words. */
function worksSoon(tokens: readonly Token[], from: number): boolean {
  for (let i = from; i < Math.min(tokens.length, from + 22); i++) {
    if (WORKING.includes(tokens[i]!.kind) || tokens[i]!.kind === 'N') return true;
  }
  return false;
}

/** `Firing four.`: a sentence of two words that ends in the number. */
function shortHead(tokens: readonly Token[], i: number, sentences: Sentences): boolean {
  const start = sentences.startOf[i]!;
  const isShort = i - start <= 2 && i > start && tokens[i + 1]?.kind === '.';
  return isShort && tokens.slice(start, i).every((token) => 'w~'.includes(token.kind));
}

/** `down to eight`, `the other three`, `ten, two, four and eight`: numbers that come to something or are picked out. */
function isResult(tokens: readonly Token[], i: number): boolean {
  const before = tokens[i - 1];
  if (
    before?.kind === 'X' ||
    /^(?:make|makes|making|need|needs|want|wants|do|does|get|gets|has|had|use|put|take|takes)$/.test(before?.text ?? '')
  )
    return true;
  if (before?.kind === '=' && !/^(?:that is|for|so|it is|its|so that is)$/.test(before.text)) return true;
  const earlier = tokens[i - 2];
  return before?.kind === ',' && earlier?.kind === 'N' && Number(earlier.value) + 1 !== Number(tokens[i]!.value);
}
