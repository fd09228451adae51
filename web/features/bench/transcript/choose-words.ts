import { type Caption } from './captions.ts';

/** Words that somebody chose in the transcript, by their numbers, both ends included. */
export interface ChosenWords {
  readonly firstWord: number;
  readonly lastWord: number;
}

/** The stretch of words that an end of a selection lies in, and which of its words it is. */
function wordAt(captions: readonly Caption[], node: Node, offset: number, isEnd: boolean): number | null {
  const stretch = node instanceof Text ? node.parentElement?.closest<HTMLElement>('[data-at]') : null;
  const caption = captions.find(({ id }) => id === stretch?.closest<HTMLElement>('[data-caption]')?.dataset.caption);
  if (!stretch || !caption || !(node instanceof Text)) return null;
  // An end just behind a space has not reached the word after it.
  const before = node.data.slice(0, isEnd ? offset - 1 : offset);
  const passed = (before.match(/\s/gu) ?? []).length;
  return caption.words[Number(stretch.dataset.at) + passed]?.n ?? null;
}

/** Numbers of the words in a stretch that lies in the selection as a whole. */
function numbersIn(captions: readonly Caption[], stretch: HTMLElement): number[] {
  const caption = captions.find(({ id }) => id === stretch.closest<HTMLElement>('[data-caption]')?.dataset.caption);
  const at = Number(stretch.dataset.at);
  const many = (stretch.textContent.match(/\s/gu) ?? []).length + 1;
  return (caption?.words.slice(at, at + many) ?? []).map(({ n }) => n).filter((n) => n >= 0);
}

/** The words that a selection of the browser touches; null where it is empty or lies elsewhere. */
export function chosenIn(
  captions: readonly Caption[],
  list: HTMLElement | null,
  selection: Selection | null,
): ChosenWords | null {
  if (!list || !selection || selection.isCollapsed || selection.rangeCount === 0) return null;
  const range = selection.getRangeAt(0);
  if (!list.contains(range.commonAncestorContainer)) return null;
  const within = [...list.querySelectorAll<HTMLElement>('[data-at]')]
    .filter((stretch) => range.intersectsNode(stretch))
    .flatMap((stretch) => numbersIn(captions, stretch));
  if (within.length === 0) return null;
  const first = wordAt(captions, range.startContainer, range.startOffset, false) ?? -1;
  const last = wordAt(captions, range.endContainer, range.endOffset, true) ?? -1;
  const firstWord = first >= 0 ? first : Math.min(...within);
  return { firstWord, lastWord: Math.max(firstWord, last >= 0 ? last : Math.max(...within)) };
}

/** All the words of one caption; null where it has none. */
export function wordsOfCaption({ words }: Caption): ChosenWords | null {
  const numbers = words.map(({ n }) => n).filter((n) => n >= 0);
  return numbers.length === 0 ? null : { firstWord: Math.min(...numbers), lastWord: Math.max(...numbers) };
}

/** Moves an end of the chosen words by one; never past the other end or the first word. */
export function moveEnd({ firstWord, lastWord }: ChosenWords, end: 'first' | 'last', by: 1 | -1): ChosenWords {
  if (end === 'first') return { firstWord: Math.max(0, Math.min(lastWord, firstWord + by)), lastWord };
  return { firstWord, lastWord: Math.max(firstWord, lastWord + by) };
}
