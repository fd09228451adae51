import { type Class } from './classes.ts';
import { TALK_WORDS } from './talk-words.ts';
import { TRADE_WORDS } from './trade-words.ts';

export interface Phrase {
  readonly words: readonly string[];
  readonly kind: Class;
  readonly value: string | number;
}

/** Phrases by their first word, longest first. */
export const PHRASES: ReadonlyMap<string, readonly Phrase[]> = buildPhrases();

function buildPhrases(): ReadonlyMap<string, readonly Phrase[]> {
  const byFirst = new Map<string, Phrase[]>();
  for (const [kind, value, list] of [...TRADE_WORDS, ...TALK_WORDS]) {
    for (const phrase of list.trim().split(/\s*,\s*/)) {
      const words = phrase.split(/\s+/);
      const entries = byFirst.get(words[0]!) ?? [];
      if (!entries.some((one) => one.words.join(' ') === words.join(' '))) entries.push({ words, kind, value });
      byFirst.set(words[0]!, entries);
    }
  }
  for (const entries of byFirst.values()) entries.sort((a, b) => b.words.length - a.words.length);
  return byFirst;
}
