import { execFileSync } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Puts a PDF into a folder of its own for a tool that wants files, and clears up after it. */
function withFile<T>(pdf: Buffer, work: (file: string, dir: string) => T): T {
  const dir = mkdtempSync(path.join(tmpdir(), 'roundelay-pdf-'));
  try {
    const file = path.join(dir, 'sheet.pdf');
    writeFileSync(file, pdf);
    return work(file, dir);
  } finally {
    rmSync(dir, { recursive: true, force: true });
  }
}

const run = (tool: string, args: readonly string[]) =>
  execFileSync(tool, args, { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] });

/** What pdfinfo says of it, by its own names. */
export function pdfInfo(pdf: Buffer): Readonly<Record<string, string>> {
  return withFile(pdf, (file) =>
    Object.fromEntries(
      run('pdfinfo', [file])
        .split('\n')
        .map((line) => /^([^:]+):\s*(.*)$/.exec(line))
        .flatMap((match) => (match ? [[match[1] ?? '', match[2] ?? ''] as const] : [])),
    ),
  );
}

/** Its words in the order in which the file holds them, which is the one that is read out. */
export const pdfText = (pdf: Buffer): string => withFile(pdf, (file) => run('pdftotext', ['-raw', file, '-']));

/** Its words laid out as they stand on the page. */
export const pdfLayout = (pdf: Buffer): string => withFile(pdf, (file) => run('pdftotext', ['-layout', file, '-']));

/** What qpdf finds wrong with it; empty where nothing is. */
export function pdfFaults(pdf: Buffer): string {
  return withFile(pdf, (file) => {
    const said = run('qpdf', ['--check', file]);
    return said.includes('No syntax or stream encoding errors found') ? '' : said;
  });
}

/** The fonts in it: name, and whether the file holds them and their letters can be read back. */
export const pdfFonts = (pdf: Buffer): readonly string[] =>
  withFile(pdf, (file) =>
    run('pdffonts', [file])
      .split('\n')
      .slice(2)
      .filter((line) => line !== ''),
  );

/** What a decoder reads from the codes on its pages, printed at 200 dots an inch. */
export function pdfCodes(pdf: Buffer): readonly string[] {
  return withFile(pdf, (file, dir) => {
    run('pdftoppm', ['-r', '200', '-png', file, path.join(dir, 'page')]);
    const pages = readdirSync(dir).filter((name) => name.endsWith('.png'));
    return pages.flatMap((page) => {
      try {
        return run('zbarimg', ['-q', '--raw', path.join(dir, page)])
          .split('\n')
          .filter((line) => line !== '');
      } catch {
        // A page without a code.
        return [];
      }
    });
  });
}
