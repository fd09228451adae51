import { readFileSync } from 'node:fs';
import { readTranscript } from '#crochet';
import { readTranscriptFile } from './features/recordings/transcript-file/read-transcript-file.ts';
import { printReading } from './features/recordings/transcript-file/print-reading.ts';

/** `npm run --silent read -- FILE`: drafts a pattern from a transcript and prints it as JSON on standard output. */
function main(path: string | undefined): number {
  if (path === undefined) {
    process.stderr.write('Usage: npm run --silent read -- FILE\n');
    return 2;
  }
  let bytes: Uint8Array;
  try {
    bytes = readFileSync(path === '-' ? 0 : path);
  } catch {
    process.stderr.write(`The file ${path} can't be read.\n`);
    return 2;
  }
  const file = readTranscriptFile(bytes, path);
  process.stdout.write(`${JSON.stringify(printReading(readTranscript(file.cues), file.problems))}\n`);
  return 0;
}

process.exitCode = main(process.argv[2]);
