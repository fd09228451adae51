/** Whether a bench is open in any tab of this browser: its tab says so every two seconds. */

const KEY = 'roundelay.bench-open';
const EVERY_MS = 2_000;
const GONE_AFTER_MS = 5_000;

/** Says that a bench is open in this tab, until the returned function is called. */
export function keepBenchOpen(): () => void {
  const say = () => localStorage.setItem(KEY, String(Date.now()));
  say();
  const timer = setInterval(say, EVERY_MS);
  return () => {
    clearInterval(timer);
    localStorage.removeItem(KEY);
  };
}

export function isBenchOpen(now = Date.now()): boolean {
  const said = Number(localStorage.getItem(KEY) ?? 0);
  return now - said < GONE_AFTER_MS;
}
