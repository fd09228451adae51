import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { codePointsOf, woffToSfnt } from './sfnt.ts';

/** The faces of a sheet: Lora for what is written, Alegreya Sans for what is worked out and for the rest. */
export type Face = 'written' | 'written-italic' | 'heading' | 'sans' | 'sans-bold';

const FILES: Readonly<Record<Face, readonly [family: 'lora' | 'alegreya-sans', weight: number, style: string]>> = {
  written: ['lora', 400, 'normal'],
  'written-italic': ['lora', 400, 'italic'],
  heading: ['lora', 600, 'normal'],
  sans: ['alegreya-sans', 400, 'normal'],
  'sans-bold': ['alegreya-sans', 700, 'normal'],
};

/** Subsets in the order in which a letter is looked for; the Latin one alone serves nearly every sheet. */
const SUBSETS = {
  lora: ['latin', 'latin-ext', 'math', 'symbols', 'cyrillic', 'cyrillic-ext', 'vietnamese'],
  'alegreya-sans': ['latin', 'latin-ext', 'cyrillic', 'cyrillic-ext', 'greek', 'greek-ext', 'vietnamese'],
} as const;

/** Where a face lacks a letter in all of its subsets, the same letter of this one stands in. */
const STAND_IN: Readonly<Record<Face, Face>> = {
  written: 'sans',
  'written-italic': 'written',
  heading: 'sans-bold',
  sans: 'written',
  'sans-bold': 'heading',
};

/** One font file: the name it is registered under in a PDF, its bytes and the letters it has. */
export interface FontFile {
  readonly name: string;
  readonly bytes: Buffer;
  readonly has: ReadonlySet<number>;
}

const require = createRequire(import.meta.url);
const loaded = new Map<string, FontFile>();

function load(family: string, subset: string, weight: number, style: string): FontFile {
  const name = `${family}-${subset}-${weight}-${style}`;
  const known = loaded.get(name);
  if (known) return known;
  const bytes = woffToSfnt(readFileSync(require.resolve(`@fontsource/${family}/files/${name}.woff`)));
  const file = { name, bytes, has: codePointsOf(bytes) };
  loaded.set(name, file);
  return file;
}

function inFace(face: Face, code: number): FontFile | null {
  const [family, weight, style] = FILES[face];
  for (const subset of SUBSETS[family]) {
    const file = load(family, subset, weight, style);
    if (file.has.has(code)) return file;
  }
  return null;
}

const answers = new Map<string, FontFile | null>();

/**
 * The file that draws a letter in a face, or the face standing in for it; null where none of the fonts has it.
 * Files are read when they are first needed and kept: they are part of the product and never change.
 */
export function fontFor(face: Face, code: number): FontFile | null {
  const key = `${face} ${code}`;
  const known = answers.get(key);
  if (known !== undefined) return known;
  const found = inFace(face, code) ?? inFace(STAND_IN[face], code);
  answers.set(key, found);
  return found;
}

/**
 * Bytes of a file that `fontFor` has named before.
 * @throws RangeError for any other name (a fault of the caller)
 */
export function fontBytes(name: string): Buffer {
  const file = loaded.get(name);
  if (!file) throw new RangeError(`no such font: ${name}`);
  return file.bytes;
}
