import { SHORT_INTRODUCTION } from './head.ts';
import type { Block } from './paginate.ts';
import type { Text } from './runs.ts';
import { body, bodyBold, BODY_LEADING, paragraphs, prose, section, type SheetContext } from './sheet-context.ts';
import type { Line } from './wrap.ts';

const TERM_WIDTH = 44;
/** Notes and lists longer than this many lines leave the columns and stand over the whole width. */
const COLUMN_LINES = 9;

interface Row {
  readonly term: readonly Line[];
  readonly lines: readonly Line[];
}
interface Column {
  readonly heading: string;
  readonly rows: readonly Row[];
}

const plain = (lines: readonly Line[]): Row => ({ term: [], lines });
const lineCount = ({ term, lines }: Row) => Math.max(term.length, lines.length, 1);
const height = ({ rows }: Column) => rows.reduce((sum, row) => sum + lineCount(row), 0);

function textRows(context: SheetContext, texts: readonly (string | readonly Text[])[], width: number): Row[] {
  return texts.flatMap((text) => {
    const spans = typeof text === 'string' ? [{ text, style: body }] : text;
    const lines = context.pen.wrap(spans, width);
    return lines.length === 0 ? [] : [plain(lines)];
  });
}

function termRow(context: SheetContext, term: string, meaning: string, width: number): Row {
  const { pen } = context;
  return {
    term: pen.wrap({ text: term, style: bodyBold }, TERM_WIDTH - 3),
    lines: pen.wrap({ text: meaning, style: body }, width - TERM_WIDTH),
  };
}

function detailTexts({ edition }: SheetContext): (string | readonly Text[])[] {
  const { gauge, finishedSize, level } = edition.details;
  const texts: (string | readonly Text[])[] = [...paragraphs(gauge), ...paragraphs(finishedSize)];
  if (edition.sizes.length > 0) texts.push(`Sizes: ${edition.sizes.join(', ')}`);
  if (level)
    texts.push([
      { text: 'Level: ', style: body },
      { text: level, style: bodyBold },
    ]);
  return texts;
}

/** The signs that this sheet really uses. */
function keyRows(context: SheetContext, width: number): Row[] {
  const { edition, terms } = context;
  const lines = edition.pieces.flatMap((piece) => piece.lines);
  const range = lines.find((line) => line.each && line.from !== null);
  const rows: Row[] = [];
  if (range) rows.push(termRow(context, range.label, `${range.kind}s ${range.from} to ${range.to ?? ''}`, width));
  if (lines.some((line) => /[)\]] ?[×x] ?\d/.test(line.text[terms]))) {
    rows.push(termRow(context, '( ) ×6', 'the inside, six times', width));
  }
  const each = range?.total?.[terms];
  if (each !== undefined) rows.push(termRow(context, `${each} each`, 'stitches each one leaves', width));
  rows.push(termRow(context, '☐', 'tick it when done', width));
  const other = lines.find((line) => (line.mark?.recordingNumber ?? 1) > 1);
  if (other?.mark)
    rows.push(
      termRow(
        context,
        `${other.mark.recordingNumber} · 01:20`,
        `at 01:20 of recording ${other.mark.recordingNumber}`,
        width,
      ),
    );
  return rows;
}

const WORKED = {
  spiral: 'Spiral: don’t join, move the marker up.',
  joined: 'Each round is joined.',
  rows: 'Worked in rows.',
} as const;

function noteTexts({ edition, terms }: SheetContext): string[] {
  const first = edition.pieces[0];
  return [`${terms} terms. ${first ? WORKED[first.worked] : ''}`.trim(), ...edition.notes.map((note) => note[terms])];
}

/** Materials, gauge, abbreviations, key and notes in four columns; what is too long for them follows below. */
export function factBlocks(context: SheetContext): Block[] {
  const { pen, edition, terms, left, right } = context;
  const gap = 11;
  const widths = [0.25, 0.235, 0.235, 0.28].map((share) => share * (right - left));
  const inner = widths.map((width) => width - gap);
  const notes = noteTexts(context);
  const shortNotes = textRows(context, notes, inner[3] ?? 0);
  const notesFit = shortNotes.reduce((sum, row) => sum + lineCount(row), 0) <= COLUMN_LINES;
  const abbreviations = edition.abbreviations.map((entry) =>
    termRow(context, entry.abbreviation[terms], entry.name[terms], inner[2] ?? 0),
  );
  const columns: Column[] = [
    {
      heading: 'Materials',
      rows: textRows(
        context,
        edition.materials.map(({ text }) => text),
        inner[0] ?? 0,
      ),
    },
    { heading: 'Gauge, size, level', rows: textRows(context, detailTexts(context), inner[1] ?? 0) },
    { heading: 'Abbreviations used', rows: abbreviations },
    {
      heading: 'Key and notes',
      rows: [...keyRows(context, inner[3] ?? 0), ...(notesFit ? shortNotes : shortNotes.slice(0, 1))],
    },
  ];
  const tallest = Math.max(...columns.map(height));
  const blocks: Block[] = [
    {
      height: 15 + tallest * BODY_LEADING + 8,
      draw: (y) => {
        let x = left;
        columns.forEach((column, i) => {
          drawColumn(context, column, x, y);
          x += widths[i] ?? 0;
        });
      },
    },
  ];
  const { introduction } = edition.details;
  if (introduction.length > SHORT_INTRODUCTION) blocks.push(...prose(context, 'About it', [introduction]));
  const special = edition.specialStitches.map(
    ({ name, abbreviation, text }) => `${name}${abbreviation === '' ? '' : ` (${abbreviation})`}: ${text[terms]}`,
  );
  blocks.push(...prose(context, 'Special stitches', special));
  if (!notesFit) blocks.push(...prose(context, 'Notes', notes.slice(1)));
  return blocks;

  function drawColumn(_: SheetContext, column: Column, x: number, y: number): void {
    if (column.rows.length === 0) return;
    const part = pen.group(pen.root, 'Sect');
    pen.tag(part, 'H2', () => pen.text(column.heading, section, x, y + 11));
    const list = pen.group(part, 'L');
    let at = y + 24.5;
    for (const row of column.rows) {
      const item = pen.group(list, 'LI');
      if (row.term.length > 0) pen.tag(item, 'Lbl', () => pen.lines(row.term, x, at, BODY_LEADING));
      const indent = row.term.length > 0 ? TERM_WIDTH : 0;
      pen.tag(item, 'LBody', () => pen.lines(row.lines, x + indent, at, BODY_LEADING));
      item.end();
      at += lineCount(row) * BODY_LEADING;
    }
    list.end();
    part.end();
  }
}
