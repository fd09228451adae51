import { type Token } from '../tokens.ts';
import { withoutCorrected } from './corrections.ts';
import { meshes, withCounted, withEchoes, withPair } from './echoes.ts';
import { type Event, only } from './event.ts';
import { withoutExplained } from './explained.ts';
import { textOf } from './spoken-of.ts';

/** Takes out of the phrases what adds nothing: what was taken back, explained twice, or only joins or turns. */
export function prune(
  spoken: readonly Event[],
  tokens: readonly Token[],
  heading: number,
  isRing: boolean,
): readonly Event[] {
  const events = withoutHeading(spoken, heading);
  return withCounted(
    withEchoes(
      meshes(
        withPair(
          withoutTurning(withoutJoins(withoutExplained(withoutCorrected(events, tokens), tokens), tokens), tokens),
          isRing,
        ),
      ),
    ),
  );
}

/** A single slip stitch behind the work, alone in its sentence or clause, closes the round and is no stitch of it. */
function withoutJoins(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const first = events.findIndex((event) => event.type === 'unit');
  const last = lastOfSentences(events, (one) => one.type === 'unit' || one.type === 'around' || one.type === 'times');
  return events.flatMap((event, n) => {
    const unit = only(event);
    if (event.type !== 'unit' || unit?.type !== 'stitch' || unit.stitch !== 'slst' || event.fills) return [event];
    if (unit.times !== 1 || unit.inOne !== 1 || n <= first) return [event];
    const closes = tokens
      .slice(event.at, event.end + 2)
      .some((token) => token.kind === 'O' || /^(?:to|join|close)$/.test(token.text));
    if (closes) return [];
    const goesOn = (last.get(event.sentence) ?? -1) > n;
    // the last of a list of stitches may still be one of them
    return goesOn ? [event] : [{ ...event, options: [[], [unit]] }];
  });
}

/** For each sentence the index of its last phrase of a kind. */
function lastOfSentences(events: readonly Event[], isKind: (event: Event) => boolean): ReadonlyMap<number, number> {
  const out = new Map<number, number>();
  events.forEach((event, n) => {
    if (isKind(event)) out.set(event.sentence, n);
  });
  return out;
}

/** A chain of one in a line without spaces only turns or lifts the work. */
const UNCOUNTED =
  /^(?:(?!\bsc\b).){0,40}?\b(?:(?:not|never|nobody|don't|doesn't|isn't|no)\b.{0,20}\b(?:count|counts|counted|stitch|anything)|uncounted|does nothing|is nothing|to begin|to start|to turn|and turn)\b/;

function isUncounted(tokens: readonly Token[], event: Event): boolean {
  const unit = only(event);
  if (unit?.type !== 'chain' || unit.many > 4) return false;
  const after = tokens.slice(event.end, event.end + 9);
  const stop = after.findIndex((token) => token.kind === '.' || token.kind === 'S');
  return UNCOUNTED.test((stop < 0 ? after : after.slice(0, stop)).map((token) => token.text).join(' '));
}

function withoutTurning(spoken: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const events = withoutFirstSkip(spoken, tokens).filter((event) => !isUncounted(tokens, event));
  const firstUnit = events.findIndex((event) => event.type === 'unit');
  const hasSpaces = events.some(
    (event) =>
      ['skip', 'oneplace'].includes(only(event)?.type ?? '') || ['corner', 'oneplace', 'here'].includes(event.type),
  );
  if (hasSpaces) return events;
  const chains = events.filter((event) => only(event)?.type === 'chain').length;
  const lastUnit = lastOfSentences(events, (one) => one.type === 'unit');
  const lastRepeat = lastOfSentences(events, (one) => REPEATS.has(one.type));
  return events.flatMap((event, n): readonly Event[] => {
    const unit = only(event);
    if (event.type !== 'unit' || unit?.type !== 'chain' || unit.many > 4) return [event];
    if (n <= firstUnit) return unit.many === 1 ? [] : [event];
    // between stitches it may be work; behind them it only turns
    const isBetween = (lastUnit.get(event.sentence) ?? -1) > n;
    const repeats = (lastRepeat.get(event.sentence) ?? -1) > n;
    if (chains < 2 && !(isBetween && (repeats || (unit.many > 1 && !isOnlyTold(tokens, event))))) return [];
    return [{ ...event, options: [[unit], []] }];
  });
}

/** `chain two and turn`, `the three chains you skipped`, `the three chain being the first of the twelve`. */
const isOnlyTold = (tokens: readonly Token[], event: Event): boolean =>
  ONLY_TOLD.test(textOf(tokens, event.end, event.end + 5)) ||
  /^(?:the|your|those|that)$/.test(tokens[event.at - 1]?.text ?? '');

const ONLY_TOLD =
  /\b(?:turn|turning|being|counts?|counted|stands?|standing|skip|skipped|miss|missed|left|not|doesn't|join|joined)\b/;

const REPEATS: ReadonlySet<string> = new Set(['times', 'around', 'again']);

/** `Round five is single crochet. In the corner …`: the stitch as a heading, worked only in what follows. */
function withoutHeading(events: readonly Event[], heading: number): readonly Event[] {
  const [first, ...rest] = events;
  const unit = first === undefined ? undefined : only(first);
  if (
    first?.type !== 'unit' ||
    first.sentence !== heading ||
    first.fills ||
    unit?.type !== 'stitch' ||
    unit.times !== 1 ||
    unit.inOne !== 1
  )
    return events;
  const inSentence = rest.filter((event) => event.sentence === first.sentence && event.type !== 'plain');
  const isHeading =
    inSentence.every((event) => only(event)?.type === 'chain') &&
    rest.some((event) => event.type === 'unit' && event.sentence !== first.sentence);
  return isHeading ? rest : events;
}

/** `skip one chain` before any stitch only says where the first goes. */
function withoutFirstSkip(events: readonly Event[], tokens: readonly Token[]): readonly Event[] {
  const first = events.findIndex((event) => event.type === 'unit');
  const event = events[first];
  if (event === undefined || only(event)?.type !== 'skip') return events;
  const ofChain = tokens.slice(event.at, event.end).some((token) => token.kind === 'C');
  return ofChain ? events.filter((_, n) => n !== first) : events;
}
