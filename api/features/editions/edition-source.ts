import type { EditionCaption, EditionMark, EditionSource, Erratum, SourceLine } from '#crochet';
import type { Line, Mark } from '#contract/rows';
import type { PatternContent } from '../patterns/document.service.ts';

/** What an edition needs beside the pattern's own rows. */
export interface Surroundings {
  readonly studio: { readonly name: string; readonly foot: string };
  /** The person who made the pattern; stands in where its details name nobody. */
  readonly creator: string;
  readonly captions: readonly EditionCaption[];
}

export interface Outgoing {
  /** Null for a draft. */
  readonly edition: number | null;
  readonly publishedAt: Date | null;
  readonly errata: readonly Erratum[];
}

function markOf(line: Line, marks: readonly Mark[], numbers: ReadonlyMap<string, number>): EditionMark | null {
  const own = marks.filter((mark) => mark.lineId === line.id);
  const mark = own.find(({ main }) => main) ?? own[0];
  const recordingNumber = mark && numbers.get(mark.recordingId);
  return mark && recordingNumber !== undefined ? { recordingNumber, startMs: mark.startMs, endMs: mark.endMs } : null;
}

function sourceLine(line: Line, marks: readonly Mark[], numbers: ReadonlyMap<string, number>): SourceLine {
  const { id, shortId, kind, label, from, to, text, note, written, said } = line;
  return {
    ...{ id, shortId, kind, label, from, to, text, note, written, said },
    leftBecause: line.putAsideReason,
    mark: line.filmed ? markOf(line, marks, numbers) : null,
  };
}

/** A pattern's rows as the pure library wants them for its edition. */
export function editionSource(content: PatternContent, around: Surroundings, out: Outgoing): EditionSource {
  const { details } = content;
  const numbers = new Map(content.recordings.map(({ id, number }) => [id, number]));
  return {
    code: content.code,
    title: content.title,
    edition: out.edition,
    publishedAt: out.publishedAt?.toISOString() ?? null,
    studio: around.studio,
    maker: details.madeBy === '' ? around.creator : details.madeBy,
    checker: details.checkedBy,
    terms: content.terms,
    sizes: content.sizes,
    details: {
      introduction: details.introduction,
      gauge: details.gauge,
      finishedSize: details.finishedSize,
      level: details.level,
      care: details.care,
      permission: details.permission,
      contact: details.contact,
    },
    materials: content.materials,
    specialStitches: content.specialStitches,
    notes: content.notes.map(({ text }) => text),
    cautions: content.cautions,
    pieces: content.pieces.map((piece) => ({
      id: piece.id,
      name: piece.name,
      make: piece.make,
      worked: piece.worked,
      lines: content.lines
        .filter((line) => line.pieceId === piece.id)
        .map((line) => sourceLine(line, content.marks, numbers)),
    })),
    recordings: content.recordings.map((recording) => ({
      number: recording.number,
      title: recording.title,
      durationMs: recording.durationMs,
      publicUrl: recording.publicUrl,
      publicOffsetMs: recording.publicOffsetMs,
      hasClip: recording.clip?.state === 'ready',
    })),
    captions: around.captions,
    errata: out.errata,
  };
}
