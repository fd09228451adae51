import { MapPin, Pause, Play, Repeat2 } from 'lucide-react';
import { cx } from '../../../lib/class-names.ts';
import { PlayerTime, SpeedPicker } from '../../../parts/player/player-bar.tsx';
import { usePlayerState } from '../../../parts/player/use-player.ts';
import { Icon } from '../../../ui/icon.tsx';
import { markAtPlayhead } from '../desk/marking.ts';
import { useDesk } from '../desk/use-desk.ts';
import { loopOf } from '../side/clip-panel.tsx';

const CELL = 'flex min-h-11 items-center justify-center gap-2 not-first:border-l not-first:border-feint';

/** Play with the time, loop, speed, mark: four equal keys. */
export function PhoneTools() {
  const desk = useDesk();
  const { player, pattern } = desk;
  const isPlaying = usePlayerState(player, (state) => state.isPlaying);
  const isLooping = usePlayerState(player, (state) => state.loop !== null);
  const { span, name } = loopOf(desk);
  return (
    <div role="group" aria-label="Player" className="grid grid-cols-4 border-y border-rule bg-chalk">
      <button
        type="button"
        aria-label={isPlaying ? 'Pause' : 'Play'}
        className={CELL}
        onClick={() => player.request({ kind: 'toggle' })}
      >
        <Icon of={isPlaying ? Pause : Play} size={19} />
        <PlayerTime player={player} />
      </button>
      <button
        type="button"
        aria-pressed={isLooping}
        aria-label={`Repeat ${name}`}
        disabled={!span && !isLooping}
        className={cx(
          CELL,
          isLooping && 'bg-woadwash font-bold text-woad shadow-[inset_0_-3px_var(--color-woad)]',
          !span && !isLooping && 'text-walnut3',
        )}
        onClick={() => player.request({ kind: 'loop', span: isLooping ? null : span })}
      >
        <Icon of={Repeat2} />
        Loop
      </button>
      <div className={CELL}>
        <SpeedPicker player={player} />
      </div>
      {pattern.mayEdit && (
        <button type="button" className={cx(CELL, 'font-medium')} onClick={() => markAtPlayhead(desk)}>
          <Icon of={MapPin} size={17} />
          Mark
        </button>
      )}
    </div>
  );
}
