import type { EditionDocument, EditionLine, EditionPiece, Erratum } from './document.ts';

/** What a later edition changes. `countsChanged` is said on its own: it is what a maker has to know first. */
export interface Difference {
  readonly countsChanged: boolean;
  readonly errata: readonly Erratum[];
}

interface Place {
  readonly piece: EditionPiece;
  readonly line: EditionLine;
}

function places(document: EditionDocument): Map<string, Place> {
  return new Map(
    document.pieces.flatMap((piece) => piece.lines.map((line) => [line.shortId, { piece, line }] as const)),
  );
}

const placeName = ({ piece, line }: Place) => (line.label === '' ? piece.name : `${piece.name}, ${line.label}`);

const clock = (ms: number) => {
  const s = Math.floor(ms / 1000);
  return `${String(Math.floor(s / 60)).padStart(2, '0')}:${String(s % 60).padStart(2, '0')}`;
};

function printed({ line }: Place, terms: EditionDocument['terms']): string {
  const total = line.total ? ` (${line.total[terms]}${line.each ? ' each' : ''})` : '';
  return `${line.text[terms]}${total}`;
}

const made = (line: EditionLine) => JSON.stringify([line.totals, line.count, line.from, line.to]);
const momentOf = ({ line }: Place) =>
  line.mark
    ? `${line.mark.recordingNumber > 1 ? `recording ${line.mark.recordingNumber}, ` : ''}${clock(line.mark.startMs)}`
    : '–';

function compareLine(was: Place, now: Place, terms: EditionDocument['terms']): Erratum | null {
  const entry = { shortId: now.line.shortId, place: placeName(now), why: '' };
  const before = printed(was, terms);
  const after = printed(now, terms);
  if (made(was.line) !== made(now.line)) return { ...entry, weight: 'correction', was: before, now: after };
  if (before !== after) return { ...entry, weight: 'clearer', was: before, now: after };
  const noteBefore = was.line.note[terms];
  const noteAfter = now.line.note[terms];
  if (noteBefore !== noteAfter) {
    return { ...entry, weight: noteBefore === '' ? 'added' : 'clearer', was: noteBefore, now: noteAfter };
  }
  if (momentOf(was) !== momentOf(now)) return { ...entry, weight: 'look', was: momentOf(was), now: momentOf(now) };
  return null;
}

/** Sections that are not lines, each as the text it prints. */
function sections(document: EditionDocument): ReadonlyMap<string, string> {
  const { details, terms } = document;
  return new Map([
    ['Title', document.title],
    ['Introduction', details.introduction],
    ['Materials', document.materials.map(({ text }) => text).join('; ')],
    ['Gauge', details.gauge],
    ['Finished size', details.finishedSize],
    ['Level', details.level ?? ''],
    ['Special stitches', document.specialStitches.map(({ name, text }) => `${name}: ${text[terms]}`).join('; ')],
    ['Notes', document.notes.map((note) => note[terms]).join(' ')],
    ['Cautions', document.cautions.map(({ text }) => text).join(' ')],
    ['Care', details.care],
    ['What may be done with it', details.permission],
    ['Contact', details.contact],
    ...document.pieces.map((piece): [string, string] => [`${piece.name}, make`, String(piece.make)]),
  ]);
}

/** Sections in which a change is one of the look, not of the work. */
const LOOK = new Set(['Title', 'Introduction', 'Contact']);

function compareSections(was: EditionDocument, now: EditionDocument): Erratum[] {
  const before = sections(was);
  return [...sections(now)].flatMap(([place, text]): Erratum[] => {
    const old = before.get(place) ?? '';
    if (old === text || (old === '' && place.endsWith(', make'))) return [];
    const counts = place.endsWith(', make');
    const weight = LOOK.has(place) ? 'look' : counts ? 'correction' : old === '' ? 'added' : 'clearer';
    return [{ shortId: null, place, weight, was: old, now: text, why: '' }];
  });
}

/**
 * What changed from edition `was` to edition `now`: lines by their short id in the order of the sheet, then what
 * went, then the sections round them. A changed total, number of rounds or number to make is a correction; other
 * words with the same counts are "made clearer"; a moment is of the look only.
 */
export function differenceOf(was: EditionDocument, now: EditionDocument): Difference {
  const before = places(was);
  const after = places(now);
  const { terms } = now;
  const lines: Erratum[] = [];
  for (const [shortId, place] of after) {
    const old = before.get(shortId);
    const erratum: Erratum | null = old
      ? compareLine(old, place, terms)
      : { shortId, place: placeName(place), weight: 'added', was: '', now: printed(place, terms), why: '' };
    if (erratum) lines.push(erratum);
  }
  for (const [shortId, place] of before) {
    if (after.has(shortId)) continue;
    const weight = place.line.totals ? 'correction' : 'clearer';
    lines.push({ shortId, place: placeName(place), weight, was: printed(place, was.terms), now: '', why: '' });
  }
  const errata = [...lines, ...compareSections(was, now)];
  const counted = (erratum: Erratum) => {
    if (erratum.weight === 'correction') return true;
    const added = erratum.weight === 'added' && erratum.shortId !== null ? after.get(erratum.shortId) : undefined;
    return added !== undefined && added.line.totals !== null;
  };
  return { countsChanged: errata.some(counted), errata };
}
