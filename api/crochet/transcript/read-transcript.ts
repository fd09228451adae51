import { type Terms } from '../span.ts';
import { withAliases } from './aliases.ts';
import { findCandidates } from './announce/candidates.ts';
import { chooseChain } from './announce/chain.ts';
import { type Cue } from './cue.ts';
import { type Draft } from './draft.ts';
import { draftPieces } from './draft-pieces.ts';
import { placeSilences } from './place-silences.ts';
import { readPieces } from './read-pieces.ts';
import { sentencesOf } from './sentences.ts';
import { findSkipped } from './skipped.ts';
import { findSteps } from './steps.ts';
import { findSuggestions } from './suggestions.ts';
import { inferTerms, inUsTerms } from './terms.ts';
import { type Token, tokensOf } from './tokens.ts';
import { type Word, wordsOf } from './words.ts';

/**
 * Drafts a pattern from a timed transcript: pieces, lines with their moments, shorthand, said totals, and for each line
 * the words it came from. Never throws; what was not understood is quoted. Takes time linear in the transcript.
 * @param options.terms overrules the terms inferred from the talk
 */
export function readTranscript(cues: readonly Cue[], options: { readonly terms?: Terms } = {}): Draft {
  const spoken = wordsOf(cues);
  const { tokens: heard, corrections } = tokensOf(spoken);
  const inferred = inferTerms(heard);
  const terms = options.terms ?? inferred.terms;
  const tokens = withAliases(inUsTerms(heard, terms));
  const sentences = sentencesOf(tokens, spoken);
  const skipped = findSkipped(tokens, sentences);
  const candidates = findCandidates(tokens, sentences).filter(
    (one) => !sentences.isPunctuated || skipped[one.mark] !== true,
  );
  const chain = chooseChain(candidates, tokens);
  const steps = findSteps(tokens, sentences, skipped);
  const moments = [...chain.map((one) => one.candidate.at), ...steps.map((step) => step.at)].sort((a, b) => a - b);
  const words = placeSilences(
    spoken,
    moments.map((at) => tokens[at]!.first),
  );
  const silenceAfter = (token: Token) => words[token.last + 1]?.silenceMs ?? 0;
  const pieces = readPieces({ tokens, sentences, skipped }, chain, steps, silenceAfter);
  return {
    terms,
    termsReason: options.terms === undefined ? inferred.reason : 'Chosen by hand.',
    pieces: draftPieces(pieces, { tokens, words, sentences }, terms),
    suggestions: findSuggestions(words, chain[0] === undefined ? words.length : tokens[chain[0].candidate.at]!.first),
    corrections: corrections.map((one) => ({ ...one, atMs: words[one.firstWord]!.startMs })),
    notice: pieces.length > 0 ? null : noticeFor(words),
  };
}

function noticeFor(words: readonly Word[]): string {
  if (words.length === 0) return 'There are no words in this transcript.';
  return 'No rounds or rows were found in this transcript. If it is not in English, mark the lines by hand: everything else works the same.';
}
