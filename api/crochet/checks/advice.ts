import { type Check, finding, many } from './check.ts';
import { refsOf, type Scan, wordsOf } from './scan.ts';
import { names, THINGS } from './things.ts';

/** What a hand reads at a glance, in UTF-16 units of an instruction, and in words of one sentence. */
const LONG_LINE = 160;
const LONG_SENTENCE = 34;

const isLong = (text: string): boolean =>
  text.length > LONG_LINE || text.split(/[.!?\n]/).some((sentence) => sentence.split(/\s+/).length > LONG_SENTENCE);

/** What a sheet is better for and goes out without. */
export function adviseSheet(scan: Scan): Check[] {
  const { details } = scan.source;
  const long = scan.lines.filter((line) => isLong(line.line.text) || isLong(line.line.note));
  return [
    ...(details.gauge.trim() === '' ? [finding('gauge-missing', 'No gauge is given.', { place: 'sheet' })] : []),
    ...(details.level === null ? [finding('level-missing', 'No level is given.', { place: 'sheet' })] : []),
    ...(long.length > 0
      ? [
          finding('long-line', `${many(long.length, 'is', 'are')} long to read with yarn in hand.`, {
            refs: refsOf(long),
          }),
        ]
      : []),
  ];
}

const EYES = THINGS.filter(({ name }) => name === 'Safety eyes' || name === 'Safety nose' || name === 'Filling');

/** Whether what is made is stuffed or has eyes: of a toy, gauge and shape are no matter until somebody asks. */
export const isToy = (scan: Scan): boolean =>
  scan.source.materials.some(({ kind, name }) => kind === 'filling' || EYES.some(({ words }) => words.test(name))) ||
  scan.lines.some((line) => EYES.some(({ words }) => names(wordsOf(line), words)));
