import { useKeys } from '../../../lib/use-keys.ts';
import { loopOf } from '../side/clip-panel.tsx';
import { closeLine } from '../pattern/open-line.tsx';
import { moveLine } from '../pattern/line-deeds.ts';
import { useUndoKeys } from '../data/use-undo-keys.ts';
import { markAtPlayhead, nudgeMoment } from './marking.ts';
import { type Desk, lineOf } from './use-desk.ts';
import { chooseSpoken, hearLine, walkCaptions, walkFaults, walkLines } from './walking.ts';

/** What the bench's keys reach beyond the desk itself. */
export interface KeyDoors {
  readonly showKeys: () => void;
  readonly find: () => void;
  readonly useSuggestion: () => void;
  readonly tell: (words: string) => void;
}

const WORDS = { undo: 'Undone', redo: 'Done again' } as const;

/** Every key of the bench. The sheet of keys (`?`) lists the same. */
export function useBenchKeys(desk: Desk, doors: KeyDoors): void {
  const { player, bench, pattern } = desk;
  const step = (byMs: number) => () => player.request({ kind: 'step', byMs });
  const move = (way: 1 | -1) => () => {
    const line = lineOf(desk, desk.lineId);
    if (line && pattern.mayEdit) moveLine(desk, line, way);
  };
  useUndoKeys(bench, (outcome, which) => doors.tell(outcome.done ? WORDS[which] : outcome.words));
  useKeys({
    Space: () => player.request({ kind: 'toggle' }),
    ArrowLeft: step(-1000),
    ArrowRight: step(1000),
    'Shift+ArrowLeft': step(-100),
    'Shift+ArrowRight': step(100),
    '-': step(-5000),
    '=': step(5000),
    ',': () => player.request({ kind: 'slower' }),
    '.': () => player.request({ kind: 'faster' }),
    L: () => player.request({ kind: 'loop', span: player.getState().loop ? null : loopOf(desk).span }),
    '/': doors.find,
    '?': doors.showKeys,
    M: () => markAtPlayhead(desk),
    '[': () => nudgeMoment(desk, -1),
    ']': () => nudgeMoment(desk, 1),
    N: () => walkFaults(desk),
    W: () => chooseSpoken(desk),
    P: () => hearLine(desk),
    C: () => desk.showChecks(!desk.isChecking),
    ArrowUp: () => walkLines(desk, -1),
    ArrowDown: () => walkLines(desk, 1),
    'Alt+ArrowUp': move(-1),
    'Alt+ArrowDown': move(1),
    PageUp: () => walkCaptions(desk, -1),
    PageDown: () => walkCaptions(desk, 1),
    Enter: () => desk.lineId && desk.pick(desk.lineId, !desk.isOpen),
    'Ctrl+Enter': doors.useSuggestion,
    Escape: () => desk.isOpen && closeLine(desk),
  });
}
