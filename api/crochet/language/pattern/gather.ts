import { type Terms } from '../../span.ts';
import { type SpecialStitch } from '../../count/input.ts';
import { foundationOf } from '../../count/base.ts';
import { hasWork } from '../groups.ts';
import { type Label } from '../labels.ts';
import { readLine } from '../read-line.ts';
import { type ReadLine } from '../tree.ts';
import { type Entry } from './cut.ts';
import { headingOf, sectionOf, type Heading, type Section } from './headings.ts';
import { type TextStretch } from './pattern-text.ts';
import { isCounted } from './counted.ts';
import { aliasesOf, definitionOf, isAbbreviation } from './special-lines.ts';

/** One line of work, a step or a heading, in the order of the text. */
export type Part =
  | { readonly type: 'heading'; readonly heading: Heading; readonly start: number; readonly end: number }
  | {
      readonly type: 'line';
      readonly label: Label | null;
      readonly labelText: string;
      readonly start: number;
      readonly bodyStart: number;
      readonly end: number;
    }
  | { readonly type: 'step' | 'note'; readonly start: number; readonly end: number };

export interface Gathered {
  readonly parts: readonly Part[];
  readonly title: string | null;
  readonly materials: readonly TextStretch[];
  readonly notes: readonly TextStretch[];
}

interface State {
  readonly parts: Part[];
  readonly sizes: number;
  readonly materials: TextStretch[];
  readonly notes: TextStretch[];
  title: string | null;
  section: Section | null;
  last: number;
}

/** Tells each entry for what it is and joins those that are one line printed over several. */
export function gather(
  text: string,
  entries: readonly Entry[],
  terms: Terms,
  special: readonly SpecialStitch[],
  sizes: number,
): Gathered {
  const state: State = {
    parts: [],
    sizes: Math.max(1, sizes),
    materials: [],
    notes: [],
    title: null,
    section: null,
    last: 0,
  };
  entries.forEach((entry, i) => {
    const next = entries[i + 1];
    take(state, text, entry, next, terms, special);
  });
  return state;
}

function take(
  state: State,
  text: string,
  entry: Entry,
  next: Entry | undefined,
  terms: Terms,
  special: readonly SpecialStitch[],
): void {
  const source = text.slice(entry.span.start, entry.span.end);
  const stretch: TextStretch = { text: source, span: entry.span };
  const section = entry.label && entry.label.kind !== 'bare' ? null : sectionOf(source);
  if (section) {
    // `Sizes: S (M, L)` says all in its own line.
    const isShort = /:\s*\S/.test(source) && section !== 'special' && section !== 'abbreviations';
    state.section = isShort ? null : section;
    (section === 'materials' ? state.materials : state.notes).push(stretch);
    return;
  }
  const body = text.slice(entry.bodyStart, entry.span.end);
  const read = readLine(oneLine(body), { terms, special, sizes: state.sizes });
  const label = isLabel(entry, read, state) ? entry.label : null;
  if (label) {
    state.section = null;
    state.last = label.to ?? label.from ?? state.last + Math.max(1, label.next);
    state.parts.push({
      type: 'line',
      label,
      labelText: entry.labelText,
      start: entry.span.start,
      bodyStart: entry.bodyStart,
      end: entry.span.end,
    });
    return;
  }
  if (aliasesOf(source, terms, state.section !== null).length > 0) {
    state.notes.push(stretch);
    return;
  }
  if (definitionOf(source, terms) && special.some((one) => source.includes(one.text))) {
    state.notes.push(stretch);
    return;
  }
  const whole = entry.label ? readLine(oneLine(source), { terms, special, sizes: state.sizes }) : read;
  if (continues(state, entry, source, whole, text)) {
    extend(state, entry.span.end);
    return;
  }
  const led = state.section ? null : headed(text, entry, terms, special, state.sizes);
  if (led) {
    state.parts.push(
      { type: 'heading', heading: led.heading, start: entry.span.start, end: led.at },
      { type: 'line', label: null, labelText: '', start: led.at, bodyStart: led.at, end: entry.span.end },
    );
    state.last = 0;
    return;
  }
  const heading = headingFor(source, whole, next);
  if (state.section && !(heading && isLead(next))) {
    const isWorkAgain =
      entry.apart &&
      isCounted(whole) &&
      state.section !== 'abbreviations' &&
      state.section !== 'special' &&
      state.section !== 'materials';
    // A chain that stands alone ends any list.
    const isChain = foundationOf(whole.tree.items, 0) !== null && !/[:=]/.test(source);
    if (!isWorkAgain && !isChain) {
      (state.section === 'materials' ? state.materials : state.notes).push(stretch);
      return;
    }
    state.section = null;
  }
  if (heading && !isCounted(whole)) {
    state.section = null;
    if (state.parts.length === 0 && state.title === null && !isLead(next)) {
      state.title = heading.name;
      return;
    }
    state.parts.push({ type: 'heading', heading, start: entry.span.start, end: entry.span.end });
    state.last = 0;
    return;
  }
  if (isAbbreviation(source, terms)) {
    state.notes.push(stretch);
    return;
  }
  if (isCounted(whole)) {
    state.parts.push({
      type: 'line',
      label: null,
      labelText: '',
      start: entry.span.start,
      bodyStart: entry.span.start,
      end: entry.span.end,
    });
    return;
  }
  const isStep = whole.tree.items.some((item) => item.type === 'step');
  if (state.parts.length === 0 && state.title === null && !isStep) state.title = source.trim();
  else if (isStep && state.parts.length > 0)
    state.parts.push({ type: 'step', start: entry.span.start, end: entry.span.end });
  else state.notes.push(stretch);
}

/** `Horns (make two): ch 5, …`: a heading and its first line on one printed line. */
function headed(
  text: string,
  entry: Entry,
  terms: Terms,
  special: readonly SpecialStitch[],
  sizes: number,
): { heading: Heading; at: number } | null {
  const source = text.slice(entry.span.start, entry.span.end);
  const colon = source.indexOf(':');
  if (colon < 0 || colon > 60 || colon + 1 >= source.trimEnd().length) return null;
  const heading = headingOf(source.slice(0, colon));
  if (!heading || heading.make < 2) return null;
  const rest = source.slice(colon + 1);
  const at = entry.span.start + colon + 1 + (rest.length - rest.trimStart().length);
  const read = readLine(oneLine(text.slice(at, entry.span.end)), { terms, special, sizes });
  return isCounted(read) ? { heading, at } : null;
}

/** Line ends made spaces, unit for unit. */
export const oneLine = (text: string): string => text.replace(/[\r\n]/g, ' ');

const isLead = (next: Entry | undefined): boolean => next?.label !== null && next?.label !== undefined;

/** A number alone is a label only in sequence and before work. */
function isLabel(entry: Entry, read: ReadLine, state: State): boolean {
  const { label } = entry;
  if (!label) return false;
  if (label.kind !== 'bare') return label.next === 0 || hasWork(read.tree.items) || read.unread.length > 0;
  if (!hasWork(read.tree.items)) return false;
  const from = label.from ?? 0;
  return (
    from === state.last + 1 ||
    from === 1 ||
    (from === 2 && state.last === 0) ||
    (state.last === 0 && from === reached(state) + 1) ||
    (from > state.last && from <= state.last + 3)
  );
}

/** The last number of the piece before, which a numbering through all of the pattern goes on from. */
function reached(state: State): number {
  const line = state.parts.slice(-NEAR).findLast((part) => part.type === 'line' && part.label !== null);
  return line?.type === 'line' ? (line.label?.to ?? line.label?.from ?? 0) : 0;
}

/** So many parts back a numbering is looked for. */
const NEAR = 8;

/** Whether an entry without a label goes on with the line before it. */
function continues(state: State, entry: Entry, source: string, read: ReadLine, text: string): boolean {
  const last = state.parts.at(-1);
  if (last?.type !== 'line' || entry.apart) return false;
  // The end of what stands there tells; a line that grows and grows is not looked through anew each time.
  const before = text.slice(Math.max(last.bodyStart, last.end - TAIL), last.end).trim();
  if (before === '') return true;
  const onlyTotal = read.total !== null && !hasWork(read.tree.items);
  const isEnded = /[.)\]}]\s*$/.test(before) || /\d\s*(sts?|stitches)?$/.test(before);
  if (onlyTotal) return !hasTotal(before);
  if (/[,;:*+(&-]\s*$/.test(before) || /\b(in|of|next|each|and|the|to|from|rep|repeat|sc|\d+)$/i.test(before))
    return true;
  const isSmall = /^[a-z*([]/.test(source.trim());
  if (isSmall && !hasTotal(before) && (hasWork(read.tree.items) || !isEnded)) return true;
  const opens = (before.match(/[([{]/g) ?? []).length > (before.match(/[)\]}]/g) ?? []).length;
  return opens;
}

/** So much of a line, in UTF-16 units, tells whether it goes on. */
const TAIL = 600;

const hasTotal = (text: string): boolean =>
  /[([{<]\s*=?\s*\d[^()[\]{}]*[)\]}>]\.?\s*$/.test(text) ||
  /[=–—-]\s*\d+\s*(sts?|sc|dc|hdc|tr|stitches)?\.?\s*$/.test(text);

function extend(state: State, end: number): void {
  const last = state.parts.at(-1);
  if (last?.type === 'line') state.parts[state.parts.length - 1] = { ...last, end };
}

/** Whether the first round or row of a piece follows. */
const beginsAnew = (next: Entry | undefined): boolean => next?.label?.from === 1 && next.label.kind !== 'bare';

function headingFor(source: string, read: ReadLine, next: Entry | undefined): Heading | null {
  const heading = headingOf(source);
  if (!heading) return null;
  const isShouted = /[A-Z]{3}/.test(source) && source === source.toUpperCase();
  const isTitled = /^\s*[A-Z#*]/.test(source);
  const closes = /:\s*$/.test(source.trim()) || heading.make > 1;
  // `Tail` alone above a first round is a piece, though a tail is also what is woven in.
  const isBareName = beginsAnew(next) && /^\s*[A-Z][A-Za-z]*( [a-z]+)?\s*$/.test(source);
  if (read.tree.items.some((item) => item.type === 'step') && !closes && !isShouted && !isBareName) return null;
  return isShouted || closes || (isTitled && next !== undefined) ? heading : null;
}
