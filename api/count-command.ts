import { readFile } from 'node:fs/promises';
import { text as readAll } from 'node:stream/consumers';
import { countReport, type Terms } from '#crochet';

interface Arguments {
  readonly file: string;
  readonly terms: Terms | null;
  readonly base: number | null;
}

/** `count FILE [--terms US|UK] [--base N]`; null where the words are not that. */
function readArguments(words: readonly string[]): Arguments | null {
  let file: string | null = null;
  let terms: Terms | null = null;
  let base: number | null = null;
  for (let i = 0; i < words.length; i += 1) {
    const word = words[i]!;
    if (word === '--terms') {
      const value = words[(i += 1)]?.toUpperCase();
      if (value !== 'US' && value !== 'UK') return null;
      terms = value;
    } else if (word === '--base') {
      base = Number(words[(i += 1)]);
      if (!Number.isInteger(base) || base < 0) return null;
    } else if (file === null) file = word;
    else return null;
  }
  return file === null ? null : { file, terms, base };
}

/** UTF-8 or UTF-16 by its byte-order mark, which is dropped. */
function decode(bytes: Uint8Array): string {
  const encoding =
    bytes[0] === 0xff && bytes[1] === 0xfe ? 'utf-16le' : bytes[0] === 0xfe && bytes[1] === 0xff ? 'utf-16be' : 'utf-8';
  return new TextDecoder(encoding).decode(bytes);
}

async function main(): Promise<number> {
  const given = readArguments(process.argv.slice(2));
  if (!given) {
    process.stderr.write('Say which file: count FILE [--terms US|UK] [--base N], with - for standard input.\n');
    return 2;
  }
  let text: string;
  try {
    text =
      given.file === '-' ? (await readAll(process.stdin)).replace(/^\ufeff/, '') : decode(await readFile(given.file));
  } catch {
    process.stderr.write(`The file ${given.file} could not be read as text.\n`);
    return 2;
  }
  process.stdout.write(`${JSON.stringify(countReport(text, given))}\n`);
  return 0;
}

process.exitCode = await main();
