import PDFDocument from 'pdfkit';
import { fontBytes, type Face } from './faces.ts';
import type { Run, Style, Text } from './runs.ts';
import { wrap, type Line, type Placed } from './wrap.ts';

export const INK = '#2B221B';
export const GREY = '#5A5047';
export const LEDGER = '#B8C6CA';
export const DOUBLE = '#8AA5B4';

type Feature = PDFKit.Mixins.OpenTypeFeatures;
const FIGURES: Readonly<Record<'plain' | 'tabular', Feature[]>> = { plain: ['lnum'], tabular: ['lnum', 'tnum'] };

const isSans = (face: Face) => face === 'sans' || face === 'sans-bold';

/** Lora's figures stand on the line by themselves; Alegreya Sans must be asked, and both for figures of one width. */
function featuresOf(run: Run): Feature[] | undefined {
  if (!/\d/.test(run.text)) return undefined;
  if (run.style.tabular) return FIGURES.tabular;
  return isSans(run.style.face) ? FIGURES.plain : undefined;
}

export interface PenOptions {
  readonly size: readonly [width: number, height: number];
  readonly title: string;
  readonly author: string;
  readonly subject: string;
  readonly made: Date;
}

/**
 * Draws on the pages of one PDF. Text is placed by its base line with the fonts that ship with the product; every
 * stroke is either inside a structure element or an artifact, so the file stays tagged throughout.
 */
export class Pen {
  readonly doc: PDFKit.PDFDocument;
  readonly #root: PDFKit.PDFStructureElement;
  readonly #widths = new Map<string, number>();
  readonly #registered = new Set<string>();

  constructor({ size, title, author, subject, made }: PenOptions) {
    this.doc = new PDFDocument({
      size: [...size],
      margin: 0,
      autoFirstPage: false,
      bufferPages: true,
      // The built-in Helvetica would be added, unused, to every file.
      font: null as unknown as string,
      pdfVersion: '1.7',
      subset: 'PDF/UA',
      tagged: true,
      lang: 'en',
      displayTitle: true,
      info: { Title: title, Author: author, Subject: subject, CreationDate: made, ModDate: made },
    } as unknown as PDFKit.PDFDocumentOptions);
    this.#root = this.doc.struct('Document');
    this.doc.addStructure(this.#root);
  }

  get root(): PDFKit.PDFStructureElement {
    return this.#root;
  }

  /** A structure element under `parent` that will hold others. */
  group(parent: PDFKit.PDFStructureElement, tag: string): PDFKit.PDFStructureElement {
    const element = this.doc.struct(tag);
    parent.add(element);
    return element;
  }

  /** Draws as the content of a structure element of its own under `parent`. */
  tag(
    parent: PDFKit.PDFStructureElement,
    tag: string,
    draw: () => void,
    options: PDFKit.Mixins.StructureElementOptions & { scope?: 'Row' | 'Column' } = {},
  ): void {
    const element = this.doc.struct(tag, options);
    parent.add(element);
    element.add(draw);
    element.end();
  }

  /** Draws what carries no meaning of its own: rules, frames, the foot. */
  artifact(draw: () => void): void {
    this.doc.markContent('Artifact', { type: 'Layout' });
    draw();
    this.doc.endMarkedContent();
  }

  #useFont(name: string, style: Style): void {
    if (!this.#registered.has(name)) {
      this.doc.registerFont(name, fontBytes(name));
      this.#registered.add(name);
    }
    this.doc.font(name).fontSize(style.size);
  }

  readonly #measure = (run: Run): number => {
    if (run.shape) return run.style.size * (run.shape === 'box' ? 1.05 : 0.95);
    const key = `${run.font}|${run.style.size}|${run.style.tabular ? 't' : ''}|${run.text}`;
    const known = this.#widths.get(key);
    if (known !== undefined) return known;
    this.#useFont(run.font, run.style);
    const features = featuresOf(run);
    const width = this.doc.widthOfString(run.text, features ? { features } : {});
    this.#widths.set(key, width);
    return width;
  };

  /** Breaks words into lines of at most `width` points. */
  wrap(texts: readonly Text[] | Text, width: number): readonly Line[] {
    return wrap(Array.isArray(texts) ? texts : [texts as Text], width, this.#measure);
  }

  widthOf(text: string, style: Style): number {
    return this.wrap({ text, style }, Infinity)[0]?.width ?? 0;
  }

  /** Draws a laid-out line with its base line at `y`. */
  line(line: Line, x: number, y: number, link?: string): void {
    for (const run of line.runs) this.#run(run, x + run.x, y, link);
  }

  /** Draws lines under each other, the first base line at `y`, the others `leading` points apart. */
  lines(lines: readonly Line[], x: number, y: number, leading: number): void {
    lines.forEach((line, i) => this.line(line, x, y + i * leading));
  }

  /** One unbroken line; `align` says which end of it stands at `x`. */
  text(
    text: string,
    style: Style,
    x: number,
    y: number,
    align: 'left' | 'right' | 'center' = 'left',
    link?: string,
  ): void {
    const [line] = this.wrap({ text, style }, Infinity);
    if (!line) return;
    const shift = align === 'left' ? 0 : align === 'right' ? line.width : line.width / 2;
    this.line(line, x - shift, y, link);
  }

  #run(run: Placed, x: number, y: number, link?: string): void {
    const colour = run.style.colour ?? INK;
    if (run.shape) {
      this.#shape(run, x, y, colour);
      return;
    }
    this.#useFont(run.font, run.style);
    const features = featuresOf(run);
    this.doc.fillColor(colour).text(run.text, x, y, {
      lineBreak: false,
      baseline: 'alphabetic',
      ...(features && { features }),
      ...(link !== undefined && { link }),
    });
  }

  /** Signs that no font of ours has, drawn: an arrow is a path, a box is a square. */
  #shape(run: Placed, x: number, y: number, colour: string): void {
    const { size } = run.style;
    const pen = this.doc.lineWidth(Math.max(0.7, size / 14)).strokeColor(colour);
    if (run.shape === 'box') {
      pen.rect(x + size * 0.06, y - size * 0.72, size * 0.78, size * 0.78).stroke();
    } else if (run.shape === 'tick') {
      pen
        .moveTo(x + size * 0.1, y - size * 0.3)
        .lineTo(x + size * 0.32, y - size * 0.06)
        .lineTo(x + size * 0.8, y - size * 0.62)
        .stroke();
    } else {
      const middle = y - size * 0.26;
      const tip = x + size * 0.85;
      pen
        .lineCap('round')
        .lineJoin('round')
        .moveTo(x + size * 0.08, middle)
        .lineTo(tip, middle);
      pen
        .moveTo(tip - size * 0.26, middle - size * 0.22)
        .lineTo(tip, middle)
        .lineTo(tip - size * 0.26, middle + size * 0.22)
        .stroke();
    }
  }

  /** A horizontal rule from `x1` to `x2`. */
  rule(x1: number, x2: number, y: number, width: number, colour = INK): void {
    this.doc.lineCap('butt').lineWidth(width).strokeColor(colour).moveTo(x1, y).lineTo(x2, y).stroke();
  }

  /** Ends the file and hands over its bytes. */
  async finish(): Promise<Buffer> {
    const chunks: Buffer[] = [];
    this.doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    const done = new Promise<void>((resolve, reject) => {
      this.doc.on('end', resolve);
      this.doc.on('error', reject);
    });
    this.#root.end();
    this.doc.end();
    await done;
    return Buffer.concat(chunks);
  }
}
