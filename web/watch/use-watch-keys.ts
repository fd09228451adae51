import { useKeys, type KeyMap } from '../lib/use-keys.ts';
import { momentOf } from './moments.ts';
import { sheetHref } from './sheet-href.ts';
import type { Watch } from './use-watch.ts';

const SECOND = 1_000;

function keyMap(watch: Watch, showKeys: () => void): KeyMap {
  const { player, act, show, before, next, edition, step, state } = watch;
  const by = (byMs: number) => () => player.request({ kind: 'step', byMs });
  const goBefore = () => before && show(before);
  const goNext = () => next && show(next);
  return {
    Space: () => player.request({ kind: 'toggle' }),
    ArrowLeft: by(-SECOND),
    ArrowRight: by(SECOND),
    'Shift+ArrowLeft': by(-SECOND / 10),
    'Shift+ArrowRight': by(SECOND / 10),
    '-': by(-5 * SECOND),
    '=': by(5 * SECOND),
    ',': () => player.request({ kind: 'slower' }),
    '.': () => player.request({ kind: 'faster' }),
    ArrowUp: goBefore,
    ArrowDown: goNext,
    PageUp: goBefore,
    PageDown: goNext,
    Enter: () => act({ kind: 'tick' }),
    L: () => player.request({ kind: 'loop', span: player.getState().loop ? null : momentOf(edition, step.line) }),
    X: () => act({ kind: 'mirror' }),
    T: () => act({ kind: 'terms', terms: state.terms === 'US' ? 'UK' : 'US' }),
    P: () => window.open(sheetHref(edition, state.terms), '_blank', 'noopener'),
    '?': showKeys,
  };
}

/** Keys of the watch page; the page-turn pedals of a music stand send two of them. */
export function useWatchKeys(watch: Watch | null, showKeys: () => void): void {
  useKeys(watch ? keyMap(watch, showKeys) : {}, watch !== null);
}
