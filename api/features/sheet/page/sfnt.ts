import { inflateSync } from 'node:zlib';

const WOFF_HEADER = 44;
const WOFF_ENTRY = 20;
const SFNT_ENTRY = 16;

/**
 * Unpacks a WOFF 1.0 font into the plain file inside it. Done once at start with zlib: the PDF library would inflate
 * every table of every font again for every sheet, in JavaScript.
 */
export function woffToSfnt(woff: Buffer): Buffer {
  const tables = woff.readUInt16BE(12);
  const power = 2 ** Math.floor(Math.log2(tables));
  const head = Buffer.alloc(12 + SFNT_ENTRY * tables);
  woff.copy(head, 0, 4, 8);
  head.writeUInt16BE(tables, 4);
  head.writeUInt16BE(power * 16, 6);
  head.writeUInt16BE(Math.log2(power), 8);
  head.writeUInt16BE(tables * 16 - power * 16, 10);
  const parts: Buffer[] = [head];
  let position = head.length;
  for (let i = 0; i < tables; i++) {
    const entry = WOFF_HEADER + WOFF_ENTRY * i;
    const offset = woff.readUInt32BE(entry + 4);
    const packed = woff.readUInt32BE(entry + 8);
    const length = woff.readUInt32BE(entry + 12);
    const raw = woff.subarray(offset, offset + packed);
    const data = packed < length ? inflateSync(raw) : raw;
    const to = 12 + SFNT_ENTRY * i;
    woff.copy(head, to, entry, entry + 4);
    head.writeUInt32BE(woff.readUInt32BE(entry + 16), to + 4);
    head.writeUInt32BE(position, to + 8);
    head.writeUInt32BE(length, to + 12);
    const padding = (4 - (length % 4)) % 4;
    parts.push(data, Buffer.alloc(padding));
    position += length + padding;
  }
  return Buffer.concat(parts);
}

function tableAt(sfnt: Buffer, tag: string): number {
  for (let i = 0; i < sfnt.readUInt16BE(4); i++) {
    const entry = 12 + SFNT_ENTRY * i;
    if (sfnt.toString('latin1', entry, entry + 4) === tag) return sfnt.readUInt32BE(entry + 8);
  }
  throw new RangeError(`the font has no table ${tag}`);
}

/** Segments of a format 4 table, those without a glyph left out: enough for the fonts that ship with the product. */
function readSegments(sfnt: Buffer, at: number, into: Set<number>): void {
  const count = sfnt.readUInt16BE(at + 6) / 2;
  const ends = at + 14;
  const starts = ends + 2 * count + 2;
  const deltas = starts + 2 * count;
  const offsets = deltas + 2 * count;
  for (let i = 0; i < count; i++) {
    const end = sfnt.readUInt16BE(ends + 2 * i);
    const start = sfnt.readUInt16BE(starts + 2 * i);
    const delta = sfnt.readUInt16BE(deltas + 2 * i);
    const offset = sfnt.readUInt16BE(offsets + 2 * i);
    for (let code = start; code <= end && code !== 0xffff; code++) {
      const glyph =
        offset === 0 ? (code + delta) & 0xffff : sfnt.readUInt16BE(offsets + 2 * i + offset + 2 * (code - start));
      if (glyph !== 0) into.add(code);
    }
  }
}

/** The code points a font has a glyph for (its format 4 and 12 tables). */
export function codePointsOf(sfnt: Buffer): ReadonlySet<number> {
  const cmap = tableAt(sfnt, 'cmap');
  const found = new Set<number>();
  for (let i = 0; i < sfnt.readUInt16BE(cmap + 2); i++) {
    const at = cmap + sfnt.readUInt32BE(cmap + 4 + 8 * i + 4);
    const format = sfnt.readUInt16BE(at);
    if (format === 4) readSegments(sfnt, at, found);
    if (format !== 12) continue;
    for (let group = 0; group < sfnt.readUInt32BE(at + 12); group++) {
      const entry = at + 16 + 12 * group;
      for (let code = sfnt.readUInt32BE(entry); code <= sfnt.readUInt32BE(entry + 4); code++) found.add(code);
    }
  }
  return found;
}
