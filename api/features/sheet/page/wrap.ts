import { runsOf, type Run, type Text } from './runs.ts';

export type Measure = (run: Run) => number;

/** A run with its place in a line, in points from the line's left edge. */
export interface Placed extends Run {
  readonly x: number;
  readonly width: number;
}

export interface Line {
  readonly runs: readonly Placed[];
  readonly width: number;
}

/** A word: runs that must stay together, and the space that stands before it. */
interface Word {
  readonly runs: readonly Run[];
  readonly spaced: boolean;
}

function wordsOf(texts: readonly Text[]): Word[] {
  const words: { runs: Run[]; spaced: boolean }[] = [];
  let spaced = false;
  let open = false;
  for (const run of texts.flatMap(runsOf)) {
    for (const part of run.text.split(/( )/)) {
      if (part === ' ') {
        spaced = true;
        open = false;
      } else if (part !== '') {
        if (!open) words.push({ runs: [], spaced: spaced && words.length > 0 });
        words.at(-1)?.runs.push({ ...run, text: part });
        spaced = false;
        open = true;
      }
    }
  }
  return words;
}

/** A word wider than the line, cut letter by letter so that nothing runs out of its column. */
function cut(word: Word, width: number, measure: Measure): Word[] {
  const pieces: { runs: Run[]; spaced: boolean }[] = [{ runs: [], spaced: word.spaced }];
  let used = 0;
  for (const run of word.runs) {
    for (const letter of run.shape ? [run.text] : run.text) {
      const one = { ...run, text: letter };
      const wide = measure(one);
      if (used + wide > width && used > 0) {
        pieces.push({ runs: [], spaced: true });
        used = 0;
      }
      const runs = pieces.at(-1)?.runs ?? [];
      const last = runs.at(-1);
      if (last?.font === run.font && last.shape === null) runs[runs.length - 1] = { ...last, text: last.text + letter };
      else runs.push(one);
      used += wide;
    }
  }
  return pieces;
}

/** Joins neighbours of one font and style, so that a line is read back as words and not as pieces. */
function place(runs: readonly Run[], measure: Measure): Line {
  const joined: Run[] = [];
  for (const run of runs) {
    const last = joined.at(-1);
    if (last?.shape === null && run.shape === null && last.font === run.font && last.style === run.style) {
      joined[joined.length - 1] = { ...last, text: last.text + run.text };
    } else joined.push(run);
  }
  let x = 0;
  const placed = joined.map((run) => {
    const width = measure(run);
    x += width;
    return { ...run, width, x: x - width };
  });
  return { runs: placed, width: x };
}

/**
 * Breaks words into lines no wider than `width` points. Where a line is broken is where it is drawn: what is
 * measured here is never broken again by the PDF library.
 */
export function wrap(texts: readonly Text[], width: number, measure: Measure): readonly Line[] {
  const lines: Line[] = [];
  let open: Run[] = [];
  let used = 0;
  const close = () => {
    if (open.length > 0) lines.push(place(open, measure));
    open = [];
    used = 0;
  };
  const add = (word: Word) => {
    const [first] = word.runs;
    if (!first) return;
    const space: Run | null = word.spaced && open.length > 0 ? { ...(open.at(-1) ?? first), text: ' ' } : null;
    const gap = space ? (space.shape ? first.style.size * 0.25 : measure(space)) : 0;
    const wide = word.runs.reduce((sum, run) => sum + measure(run), 0);
    if (open.length > 0 && used + gap + wide > width) {
      close();
      add({ ...word, spaced: false });
      return;
    }
    if (wide > width && open.length === 0) {
      const [head, ...tail] = cut(word, width, measure);
      if (tail.length > 0 && head) {
        for (const piece of [head, ...tail]) {
          close();
          open = [...piece.runs];
          used = piece.runs.reduce((sum, run) => sum + measure(run), 0);
        }
        return;
      }
    }
    if (space) open.push(space.shape ? { ...first, text: ' ' } : space);
    open.push(...word.runs);
    used += gap + wide;
  };
  for (const word of wordsOf(texts)) add(word);
  close();
  return lines;
}
