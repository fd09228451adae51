import { fontFor, type Face } from './faces.ts';

export interface Style {
  readonly face: Face;
  /** In points. */
  readonly size: number;
  readonly colour?: string;
  /** Figures all of one width, for columns of totals. */
  readonly tabular?: boolean;
}

/** Words in one style. */
export interface Text {
  readonly text: string;
  readonly style: Style;
}

/** A stretch drawn with one font file, or one of our own shapes for a sign that no font of ours has. */
export interface Run {
  readonly text: string;
  readonly style: Style;
  readonly font: string;
  readonly shape: Shape | null;
}

export type Shape = 'arrow' | 'tick' | 'box';

const SHAPES: ReadonlyMap<string, Shape> = new Map([
  ['→', 'arrow'],
  ['✓', 'tick'],
  ['✔', 'tick'],
  ['☐', 'box'],
]);

/** The letters a sign is printed with: itself, its plain form, or nothing where no font of ours has either. */
function printable(face: Face, sign: string): string {
  if (SHAPES.has(sign)) return sign;
  if (fontFor(face, sign.codePointAt(0) ?? 0)) return sign;
  const plain = Array.from(sign.normalize('NFKD').replace(/\u2044/g, '/')).filter((part) =>
    fontFor(face, part.codePointAt(0) ?? 0),
  );
  return plain.join('').normalize('NFC');
}

/** Signs that cannot be printed and would be left out, each once. */
export function unprintable(text: string): readonly string[] {
  const missing = Array.from(text.normalize('NFC')).filter(
    (sign) => !/\s/.test(sign) && printable('written', sign) === '',
  );
  return [...new Set(missing)];
}

/** Splits words by the font file that has their letters; what no font has is left out, never drawn as a box. */
export function runsOf({ text, style }: Text): readonly Run[] {
  const runs: Run[] = [];
  const spaced = text.normalize('NFC').replace(/\s+/g, ' ');
  for (const sign of spaced) {
    const shape = SHAPES.get(sign) ?? null;
    if (shape) {
      runs.push({ text: sign, style, font: '', shape });
      continue;
    }
    for (const letter of printable(style.face, sign)) {
      const font = fontFor(style.face, letter.codePointAt(0) ?? 0);
      const last = runs.at(-1);
      if (!font) continue;
      if (last?.shape === null && (last.font === font.name || letter === ' ')) {
        runs[runs.length - 1] = { ...last, text: last.text + letter };
      } else runs.push({ text: letter, style, font: font.name, shape });
    }
  }
  return runs;
}
