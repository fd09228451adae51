import { type Draft, type DraftLine, spellWork } from '#crochet';
import { type FileProblem } from './problem.ts';

/** The reading of a transcript in the shape of the count's JSON, for the command line. */
export function printReading(draft: Draft, problems: readonly FileProblem[]): unknown {
  return {
    terms: draft.terms,
    termsReason: draft.termsReason,
    pieces: draft.pieces.map((piece) => ({
      name: piece.name,
      make: piece.make,
      worked: piece.worked,
      lines: piece.lines.map(printLine),
    })),
    suggestions: draft.suggestions,
    corrections: draft.corrections,
    problems,
  };
}

function printLine(line: DraftLine): unknown {
  const at = Math.round(line.startMs / 100) / 10;
  if (line.kind === 'step') return { kind: 'step', at, topic: line.topic, text: line.text, evidence: line.evidence };
  return {
    kind: line.kind,
    ...(line.from === null ? {} : { from: line.from, to: line.to }),
    label: line.label,
    at,
    text: line.text,
    work: spellWork(line.units),
    loops: line.loops,
    said: line.said?.sts?.[0] ?? null,
    count: line.count,
    verdict: line.verdict,
    confidence: line.confidence,
    evidence: line.evidence,
    unread: line.unread,
  };
}
