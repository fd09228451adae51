import { useEffect, useState, useSyncExternalStore } from 'react';
import { createPlayer, type Player } from './create-player.ts';
import { type PlayerState } from './player-state.ts';

/** One player for the life of the component; it rests when the component goes. */
export function useNewPlayer(durationMs = 0): Player {
  const [player] = useState(() => createPlayer(durationMs));
  useEffect(() => () => player.request({ kind: 'pause' }), [player]);
  return player;
}

/**
 * Reads one thing of the player's state and renders anew only when that thing changes. The position changes sixty times a
 * second: pick what is drawn (a caption's number, whole tenths), not the position itself. `pick` must return a plain value.
 */
export function usePlayerState<T extends string | number | boolean | null>(
  player: Player,
  pick: (state: PlayerState) => T,
): T {
  const read = () => pick(player.getState());
  return useSyncExternalStore(player.subscribe, read, read);
}
