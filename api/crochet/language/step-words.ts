import { type Lex } from './lexer.ts';
import { isPlain, isWord } from './reading.ts';

/** Verbs that begin something done which adds no stitch; figures in such a clause are no counts. */
export const VERBS = new Set(
  (
    'stuff insert attach sew cut weave fasten finish fo change switch drop pick pull close tie embroider fold pinch ' +
    'mark move put add secure start begin continue flatten hold remember note use gather tighten remove draw thread ' +
    'block press hide bind trim glue pin position slide leave break rejoin introduce carry keep see repeat-for stitch-up ' +
    'turn-inside lightly firmly filling fill shape attaching sewing stuffing changing counting photo picture pic ' +
    'leaving place placing colour color yarn tail end invisible steam wash wind wrap push cinch burst separate lay pass-tail ends using ' +
    'optional tip hint important if when you this these now-you safety eyes eye button buttons work-in measure measures ' +
    'piece yarn-over right wrong rs ws loosely tightly lengthen approx approximately about it he she we i with cont ' +
    'do-not-stuff skip-stuffing proceed assemble assembly'
  ).split(' '),
);

/** A word that begins something done: a total before it is over. */
export const isStepWord = (lex: Lex): boolean =>
  isWord(lex, 'join', 'turn') || isPlain(lex, 'now') || (lex.kind === 'word' && VERBS.has(lex.text));
