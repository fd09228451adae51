import type { PublicLine, PublicPiece } from '#crochet';
import { BOX_ROW, drawBoxes, planBoxes, planCopies, ticksAtHeading, type BoxPlan } from './boxes.ts';
import { clockTime } from './dates.ts';
import type { Block, Running } from './paginate.ts';
import { DOUBLE, GREY, LEDGER } from './pen.ts';
import type { Style } from './runs.ts';
import { body, type SheetContext } from './sheet-context.ts';
import type { Line } from './wrap.ts';

const heading: Style = { face: 'heading', size: 12 };
const label: Style = { face: 'sans-bold', size: 10.1 };
const instruction: Style = { face: 'written', size: 10.5 };
const step: Style = { face: 'written-italic', size: 10.05 };
const total: Style = { face: 'sans-bold', size: 10.5, tabular: true };
const each: Style = { face: 'sans', size: 10.1 };
const at: Style = { face: 'sans', size: 9.4, colour: GREY, tabular: true };
const note: Style = { face: 'sans', size: 9.6, colour: GREY };

/** Columns, in points from the left edge; totals and moments from the right. */
const LABEL_X = 54;
const TEXT_X = 103;
const AT_WIDTH = 46;
const TOTAL_WIDTH = 74;
const ROW = 16.9;
const LEADING = 15.4;
const STEP_LEADING = 13.1;
const NOTE_LEADING = 12;
/** A piece's heading stays with this many of its lines. */
const KEEP = 3;

const WORKED = { spiral: 'in a spiral', joined: 'in joined rounds', rows: 'worked flat' } as const;

interface Row {
  readonly line: PublicLine;
  readonly text: readonly Line[];
  readonly note: readonly Line[];
  readonly totals: readonly (readonly Line[])[];
  readonly boxes: BoxPlan;
  readonly textX: number;
  readonly leading: number;
  readonly height: number;
}

const isStep = (line: PublicLine) => line.kind === 'step' || line.kind === 'note';

/** "12 dc, 4 ch-2 sps" one kind under another; commas inside brackets stay ("24 (30, 36)"). */
const kinds = (text: string) => text.split(/, (?![^(]*\))/);

function layTotals({ pen, terms }: SheetContext, line: PublicLine): Line[][] {
  if (!line.total || isStep(line)) return [];
  const parts = kinds(line.total[terms]);
  return parts.map((part, i) => {
    const word = line.each && i === parts.length - 1 ? [{ text: ' each', style: each }] : [];
    return [...pen.wrap([{ text: part, style: total }, ...word], TOTAL_WIDTH - 12)];
  });
}

function layRow(context: SheetContext, line: PublicLine, make: number): Row {
  const { pen, terms, left, right } = context;
  const asStep = isStep(line);
  const textX = asStep ? LABEL_X : TEXT_X;
  const end = asStep ? right - AT_WIDTH - 8 : right - AT_WIDTH - TOTAL_WIDTH - 8;
  const style = line.kind === 'note' ? body : asStep ? step : instruction;
  const text = pen.wrap({ text: line.text[terms], style }, end - left - textX);
  const notes = line.note[terms] === '' ? [] : pen.wrap({ text: line.note[terms], style: note }, end - left - textX);
  const totals = layTotals(context, line);
  const boxes = planBoxes(line, make);
  const leading = asStep ? STEP_LEADING : LEADING;
  const under = boxes.where === 'under' ? boxes.rows.length * BOX_ROW + 2 : 0;
  const tall = Math.max(1, text.length) * leading + notes.length * NOTE_LEADING + under;
  const beside = boxes.where === 'beside' ? boxes.rows.length * BOX_ROW : 0;
  const height = Math.max(ROW, tall + 3, beside + 4.5, totals.flat().length * LEADING + 1.5);
  return { line, text, note: notes, totals, boxes, textX, leading, height };
}

function moment(line: PublicLine): string {
  if (!line.mark) return '';
  const time = clockTime(line.mark.startMs);
  return line.mark.recordingNumber > 1 ? `${line.mark.recordingNumber} · ${time}` : time;
}

function drawRow(context: SheetContext, table: PDFKit.PDFStructureElement, row: Row, y: number): void {
  const { pen, terms, left, right, address } = context;
  const { line } = row;
  const base = y + (isStep(line) ? 11.2 : 12);
  const dividerX = right - AT_WIDTH - TOTAL_WIDTH;
  const boxesY =
    row.boxes.where === 'beside'
      ? y + 4.1
      : base + row.text.length * row.leading + row.note.length * NOTE_LEADING - 8.5;
  pen.artifact(() => {
    pen.rule(left, right, y + row.height, 0.6, LEDGER);
    if (!isStep(line)) {
      const { doc } = pen;
      doc.lineWidth(0.6).strokeColor(DOUBLE);
      for (const x of [dividerX, dividerX + 2.2])
        doc
          .moveTo(x, y)
          .lineTo(x, y + row.height)
          .stroke();
    }
    drawBoxes(pen.doc, row.boxes, left + (row.boxes.where === 'beside' ? 0.4 : row.textX), boxesY);
  });
  const tr = pen.group(table, 'TR');
  if (line.label !== '') pen.tag(tr, 'TH', () => pen.text(line.label, label, left + LABEL_X, base), { scope: 'Row' });
  pen.tag(tr, 'TD', () => {
    pen.lines(row.text, left + row.textX, base, row.leading);
    pen.lines(
      row.note,
      left + row.textX,
      base + row.text.length * row.leading - (row.leading - NOTE_LEADING),
      NOTE_LEADING,
    );
  });
  if (row.totals.length > 0) {
    pen.tag(tr, 'TD', () => {
      row.totals.flat().forEach((part, i) => pen.line(part, right - AT_WIDTH - part.width, base + i * LEADING));
    });
  }
  const time = moment(line);
  if (time !== '') {
    const cell = pen.group(tr, 'TD');
    pen.tag(cell, 'Link', () => pen.text(time, at, right, base, 'right', `${address}#${line.shortId}`), {
      alt: `${line.label === '' ? line.text[terms] : line.label} in the recording`,
    });
    cell.end();
  }
  tr.end();
}

function headingText(piece: PublicPiece): string {
  const copies =
    piece.make > 1 ? ` Tick ${ticksAtHeading(piece.make) ? 'each one here' : 'each one at every line'}.` : '';
  return `make ${piece.make}, ${WORKED[piece.worked]}.${copies}`;
}

/** A piece: its heading with at least three of its lines, then a ledger line for every round, row and step. */
export function pieceBlocks(context: SheetContext, piece: PublicPiece, first: boolean): Block[] {
  const { pen, left, right } = context;
  const rows = piece.lines.map((line) => layRow(context, line, piece.make));
  const copies = ticksAtHeading(piece.make) ? planCopies(piece.make) : null;
  const copiesHeight = copies ? copies.rows.length * BOX_ROW + 6 : 0;
  const part = { table: null as PDFKit.PDFStructureElement | null };
  const counted = piece.lines.some((line) => line.total !== null);
  const marked = piece.lines.some((line) => line.mark !== null);

  const drawHeading = (y: number, continued: boolean) => {
    const base = y + 13;
    pen.artifact(() => pen.rule(left, right, y + 17.2, 0.9));
    const words = pen.wrap(
      [
        { text: piece.name, style: heading },
        { text: continued ? '  continued' : `  ${headingText(piece)}`, style: body },
      ],
      right - left - AT_WIDTH - TOTAL_WIDTH,
    );
    if (continued) pen.artifact(() => words.slice(0, 1).forEach((line) => pen.line(line, left, base)));
    else {
      pen.doc.outline.addItem(piece.name);
      pen.tag(pen.root, 'H2', () => words.slice(0, 1).forEach((line) => pen.line(line, left, base)));
      part.table = pen.group(pen.root, 'Table');
    }
    const columns = () => {
      if (counted) pen.text('stitches', { ...at, tabular: false }, right - AT_WIDTH, base, 'right');
      if (marked) pen.text('at', { ...at, tabular: false }, right, base, 'right');
    };
    pen.artifact(columns);
  };
  const running: Running = { height: 19, draw: (y) => drawHeading(y, true) };
  const above = first ? 4 : 9;
  const blocks: Block[] = [
    {
      height: above + 17.2 + copiesHeight,
      keepNext: Math.min(KEEP, rows.length),
      draw: (y) => {
        drawHeading(y + above, false);
        if (copies) pen.artifact(() => drawBoxes(pen.doc, copies, left, y + above + 22));
      },
    },
    ...rows.map((row): Block => ({
      height: row.height,
      running,
      draw: (y) => {
        if (part.table) drawRow(context, part.table, row, y);
      },
    })),
  ];
  blocks.push({ height: 0, draw: () => part.table?.end() });
  return blocks;
}
