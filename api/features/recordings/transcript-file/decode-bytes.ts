import { type FileProblem } from './problem.ts';

export type Encoding = 'UTF-8' | 'UTF-16LE' | 'UTF-16BE' | 'Windows-1252';

export interface DecodedText {
  readonly text: string;
  readonly encoding: Encoding;
  readonly problems: readonly FileProblem[];
}

const SAMPLE = 4096;

/**
 * Turns the bytes of a transcript into text. A byte-order mark decides; without one, UTF-16 is known by its zero bytes,
 * UTF-8 by being well formed, and anything else is taken for Windows-1252, in which every byte means something.
 * Never throws. The mark itself is dropped and the text is composed (NFC).
 */
export function decodeBytes(bytes: Uint8Array): DecodedText {
  const marked = markedEncoding(bytes) ?? zeroBytesEncoding(bytes);
  if (marked !== null) return { text: decodeAs(bytes, marked), encoding: marked, problems: [] };
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return { text: text.normalize('NFC'), encoding: 'UTF-8', problems: [] };
  } catch {
    return {
      text: decodeAs(bytes, 'Windows-1252'),
      encoding: 'Windows-1252',
      problems: [
        {
          line: 0,
          what: 'The file is not in UTF-8.',
          done: 'It was read as Windows-1252. Please look at accents and quotation marks.',
        },
      ],
    };
  }
}

function markedEncoding(bytes: Uint8Array): Encoding | null {
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return 'UTF-8';
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'UTF-16LE';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'UTF-16BE';
  return null;
}

/** In UTF-16 of a European language every second byte is zero; in the other encodings hardly any is. */
function zeroBytesEncoding(bytes: Uint8Array): Encoding | null {
  const zeros = [0, 0];
  const length = Math.min(bytes.length, SAMPLE) & ~1;
  for (let i = 0; i < length; i++) if (bytes[i] === 0) zeros[i & 1]! += 1;
  const half = length / 2;
  if (half < 4) return null;
  if (zeros[1]! > half * 0.6 && zeros[0]! < half * 0.1) return 'UTF-16LE';
  if (zeros[0]! > half * 0.6 && zeros[1]! < half * 0.1) return 'UTF-16BE';
  return null;
}

/** What Windows-1252 has at 0x80 to 0x9F; some runtimes decode these as Latin-1 controls, so they are set right here. */
const WINDOWS_1252_HIGH = '€\x81‚ƒ„…†‡ˆ‰Š‹Œ\x8dŽ\x8f\x90‘’“”•–—˜™š›œ\x9džŸ';

function decodeAs(bytes: Uint8Array, encoding: Encoding): string {
  const text =
    encoding === 'Windows-1252' ? decodeWindows1252(bytes) : new TextDecoder(encoding.toLowerCase()).decode(bytes);
  return text.replace(/^\uFEFF/, '').normalize('NFC');
}

function decodeWindows1252(bytes: Uint8Array): string {
  let text = '';
  for (const byte of bytes) {
    const isHigh = byte >= 0x80 && byte < 0xa0;
    text += isHigh ? WINDOWS_1252_HIGH.charAt(byte - 0x80) : String.fromCharCode(byte);
  }
  return text;
}
