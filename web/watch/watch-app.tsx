import { useState } from 'react';
import { createPortal } from 'react-dom';
import type { PublicEdition } from '#contract/editions';
import { useNewPlayer } from '../parts/player/use-player.ts';
import { Dock } from './dock.tsx';
import { Rounds } from './rounds.tsx';
import { Stage } from './stage.tsx';
import { Tools } from './tools.tsx';
import { useWatchPage, WatchContext } from './use-watch.ts';
import { useWatchKeys } from './use-watch-keys.ts';
import { Work } from './work.tsx';

export type Islands = Readonly<Record<'tools' | 'stage' | 'work' | 'rounds' | 'dock', HTMLElement>>;

/** The living watch page: one state, drawn into the places that the server's page has marked. */
export function WatchApp({ edition, islands }: { edition: PublicEdition; islands: Islands }) {
  const player = useNewPlayer();
  const watch = useWatchPage(edition, player);
  const [showsKeys, setShowsKeys] = useState(false);
  useWatchKeys(watch, () => setShowsKeys(true));
  if (!watch) return null;
  return (
    <WatchContext value={watch}>
      {createPortal(<Tools showsKeys={showsKeys} onKeys={setShowsKeys} />, islands.tools)}
      {createPortal(<Stage />, islands.stage)}
      {createPortal(<Work />, islands.work)}
      {createPortal(<Rounds />, islands.rounds)}
      {createPortal(<Dock />, islands.dock)}
    </WatchContext>
  );
}
