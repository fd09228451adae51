import { Counter } from './counter.ts';
import { type Reply, type Request } from './protocol.ts';

/** The counting thread: the page never waits for it. What is newer is taken up as soon as a piece is done. */

const counter = new Counter();
const waiting: Request[] = [];
let isBusy = false;

const tell = (reply: Reply) => self.postMessage(reply);
/** Lets messages that have come in meanwhile be heard. */
const breathe = () =>
  new Promise<void>((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });

const TOLD_EVERY_MS = 100;

async function count({ seq, asked }: Extract<Request, { kind: 'count' }>): Promise<void> {
  const from = performance.now();
  let told = from;
  const counted = await counter.count(asked, async (done, of) => {
    if (performance.now() - told < TOLD_EVERY_MS) return true;
    told = performance.now();
    tell({ kind: 'progress', seq, done, of });
    await breathe();
    return !waiting.some((request) => request.kind === 'count');
  });
  if (counted) tell({ kind: 'counted', seq, counted, ms: performance.now() - from });
}

async function answer(request: Request): Promise<void> {
  const { kind, seq } = request;
  if (kind === 'count') await count(request);
  else if (kind === 'repairs') tell({ kind, seq, lineId: request.lineId, repairs: counter.repairs(request.lineId) });
  else if (kind === 'draw') tell({ kind, seq, pieceId: request.pieceId, lines: counter.draw(request.pieceId) });
  else tell({ kind, seq, changes: counter.house() });
}

/** The newest text first; what was asked of an older one is passed over. */
function next(): Request | undefined {
  const newest = waiting.findLastIndex((request) => request.kind === 'count');
  if (newest > 0) waiting.splice(0, newest);
  return waiting.shift();
}

self.onmessage = ({ data }: MessageEvent<Request>) => {
  waiting.push(data);
  if (isBusy) return;
  isBusy = true;
  void (async () => {
    for (let request = next(); request; request = next()) await answer(request);
    isBusy = false;
  })();
};
