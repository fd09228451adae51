import { type Sample } from '../shape/silhouette.ts';

const MM: Readonly<Record<string, number>> = { mm: 1, cm: 10, in: 25.4 };
const NUMBER = String.raw`(\d+(?:[.,]\d+)?)`;
const UNIT = String.raw`(mm|cm|in(?:ch(?:es)?)?|["″])`;
/** "22 sc and 24 rows = 10 cm", "10 sc and 9 rounds make 4.4 × 4.5 cm", "18 sts × 20 rnds to 4 in". */
const GAUGE = new RegExp(
  `${NUMBER} ?(?!rows?\\b|rounds?\\b|rnds?\\b)[a-z][a-z. ]{0,24}?(?:and|by|x|×|,|&|/|;)? ?${NUMBER} ?(?:rows?|rounds?|rnds?|r)\\b[^\\d]{0,24}?${NUMBER} ?${UNIT}?(?: ?(?:×|x|by) ?${NUMBER} ?${UNIT}?)?`,
  'iu',
);

const number = (text: string) => Number(text.replace(',', '.'));
const unit = (text: string | undefined) => (text === undefined ? undefined : (MM[text.toLowerCase()] ?? MM.in));

/**
 * The width and height of one stitch in millimetres from a gauge in words; null where it does not say both.
 *
 * @example gaugeOf('20 sc and 25 rows = 10 cm') // { width: 5, height: 4 }
 */
export function gaugeOf(text: string): Sample | null {
  const found = GAUGE.exec(text);
  if (!found) return null;
  const [, stitches = '', rows = '', across = '', unitA, down, unitB] = found;
  const mmAcross = unit(unitA) ?? unit(unitB);
  const mmDown = unit(unitB) ?? unit(unitA);
  if (mmAcross === undefined || mmDown === undefined) return null;
  const width = (number(across) * mmAcross) / number(stitches);
  const height = (number(down ?? across) * mmDown) / number(rows);
  return [width, height].every((size) => Number.isFinite(size) && size > 0) ? { width, height } : null;
}
