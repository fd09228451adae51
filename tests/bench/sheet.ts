import { pathToFileURL } from 'node:url';
import { buildEdition, projectEdition } from '#crochet';
import { renderSheet } from '../../api/features/sheet/page/render-sheet.ts';
import { mouseSource, round, step } from '../support/mouse-source.ts';
import { type BenchRow } from './read.ts';

const RUNS = 20;
const LONG_LINES = 200;

/** A body of many lines, six pages or so on A4. */
function longSource() {
  const source = mouseSource();
  const lines = Array.from({ length: LONG_LINES }, (_, i) => {
    const n = i + 1;
    if (n % 20 === 0) return step(`After round ${n}: stuff firmly, and look at it from the side.`, `s${n}`);
    return round(`R${n}`, n === 1 ? '24 sc in magic ring (24)' : 'sc around (24)', n, { shortId: `l${n}` });
  });
  return { ...source, pieces: [{ ...source.pieces[0]!, lines }, ...source.pieces.slice(1)] };
}

const median = (times: readonly number[]) => [...times].sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? 0;

async function measure(what: string, source: ReturnType<typeof mouseSource>): Promise<BenchRow[]> {
  const edition = projectEdition(buildEdition(source));
  const address = 'https://roundelay.example/w/h9m2k7p4/1';
  const times: number[] = [];
  let bytes = 0;
  const before = process.memoryUsage().rss;
  for (let run = 0; run < RUNS; run++) {
    const from = performance.now();
    bytes = (await renderSheet(edition, { paper: 'A4', terms: 'US', address, made: new Date(0) })).length;
    times.push(performance.now() - from);
  }
  const grown = (process.memoryUsage().rss - before) / 1e6;
  return [
    { what: `${what}, the first`, figure: `${times[0]?.toFixed(0)} ms` },
    { what: `${what}, then`, figure: `${median(times.slice(1)).toFixed(0)} ms, ${(bytes / 1000).toFixed(0)} kB` },
    { what: `${what}, more memory after ${RUNS}`, figure: `${grown.toFixed(0)} MB` },
  ];
}

/** How long a sheet takes, cold and warm, and whether a row of them leaves memory behind. */
export async function benchSheets(): Promise<readonly BenchRow[]> {
  return [
    ...(await measure('a short sheet', mouseSource())),
    ...(await measure(`a sheet of ${LONG_LINES} lines`, longSource())),
  ];
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  for (const { what, figure } of await benchSheets()) process.stdout.write(`${what.padEnd(40)} ${figure}\n`);
}
