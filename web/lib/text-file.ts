/** Largest text file that is taken, in bytes. */
export const MOST_FILE_BYTES = 1_000_000;

export type TextFile =
  | { readonly text: string; readonly encoding: 'UTF-8' | 'UTF-16' | 'Windows-1252' }
  | { readonly problem: 'empty' | 'too-large' | 'not-text' };

const SAMPLE_BYTES = 4_096;

/** In UTF-16 of a European language every second byte is zero; in the other encodings hardly any is. */
function utf16Of(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  const sample = bytes.subarray(0, SAMPLE_BYTES);
  const half = sample.length / 2;
  const zeros = [0, 0];
  sample.forEach((byte, i) => {
    if (byte === 0) zeros[i % 2]! += 1;
  });
  if (half < 4) return null;
  if (zeros[1]! > half * 0.6 && zeros[0]! < half * 0.1) return 'utf-16le';
  return zeros[0]! > half * 0.6 && zeros[1]! < half * 0.1 ? 'utf-16be' : null;
}

/** Whether a code unit is a control that no text has: not tab, line end or form feed. */
const isControl = (code: number): boolean => code < 9 || code === 11 || (code > 13 && code < 32);

function hasControls(text: string): boolean {
  for (let i = 0; i < text.length; i += 1) if (isControl(text.charCodeAt(i))) return true;
  return false;
}

function decode(bytes: Uint8Array): Exclude<TextFile, { problem: unknown }> {
  const wide = utf16Of(bytes);
  if (wide) return { text: new TextDecoder(wide).decode(bytes), encoding: 'UTF-16' };
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes), encoding: 'UTF-8' };
  } catch {
    return { text: new TextDecoder('windows-1252').decode(bytes), encoding: 'Windows-1252' };
  }
}

/**
 * Reads bytes as text: UTF-8, UTF-16 (known by its mark or its zero bytes), else Windows-1252, in which every byte means
 * something. A byte-order mark is dropped. What is no text is not turned into any.
 */
export function readTextBytes(bytes: Uint8Array): TextFile {
  if (bytes.length > MOST_FILE_BYTES) return { problem: 'too-large' };
  const { text, encoding } = decode(bytes);
  if (hasControls(text)) return { problem: 'not-text' };
  const plain = text.replace(/^\uFEFF/, '');
  return plain.trim() === '' ? { problem: 'empty' } : { text: plain, encoding };
}

/** Reads a chosen or dropped file; a large one is refused before it is opened. */
export async function readTextFile(file: File): Promise<TextFile> {
  if (file.size > MOST_FILE_BYTES) return { problem: 'too-large' };
  return readTextBytes(new Uint8Array(await file.arrayBuffer()));
}

/** What was wrong with a file, and what to do. */
export const TEXT_FILE_PROBLEMS: Readonly<Record<'empty' | 'too-large' | 'not-text', string>> = {
  empty: 'There is nothing written in this file.',
  'too-large': 'This file is larger than 1 MB. Take out a part, or paste the pieces one after another.',
  'not-text': 'This is not a text file. Copy the words out of it, or save it as plain text (.txt).',
};
