import { Pause, Play, Repeat2, SkipBack, SkipForward } from 'lucide-react';
import { type ReactNode } from 'react';
import { cx } from '../../lib/class-names.ts';
import { formatTenths } from '../../lib/time.ts';
import { IconButton } from '../../ui/button.tsx';
import { type Player } from './create-player.ts';
import { type Span, SPEEDS } from './player-state.ts';
import { usePlayerState } from './use-player.ts';

/** Our own controls: before, play, next, the time, loop, speed, and whatever the desk adds at the end. */
export function PlayerBar({
  player,
  loopSpan,
  loopName,
  onBefore,
  onNext,
  stepName = 'caption',
  children,
}: {
  player: Player;
  /** What the loop button repeats; null where there is nothing to repeat yet. */
  loopSpan: Span | null;
  loopName: string;
  onBefore: () => void;
  onNext: () => void;
  stepName?: string;
  children?: ReactNode;
}) {
  const isPlaying = usePlayerState(player, (state) => state.isPlaying);
  return (
    <div
      role="group"
      aria-label="Player"
      className="flex h-[42px] items-center gap-0.5 border-b border-rule bg-sheet px-2"
    >
      <IconButton icon={SkipBack} label={`${stepName} before`} onClick={onBefore} aria-keyshortcuts="PageUp" />
      <IconButton
        icon={isPlaying ? Pause : Play}
        size={19}
        label={isPlaying ? 'Pause' : 'Play'}
        aria-keyshortcuts="Space"
        onClick={() => player.request({ kind: 'toggle' })}
      />
      <IconButton icon={SkipForward} label={`${stepName} after`} onClick={onNext} aria-keyshortcuts="PageDown" />
      <PlayerTime player={player} />
      <span className="grow" />
      <LoopButton player={player} span={loopSpan} name={loopName} />
      <SpeedPicker player={player} />
      {children}
    </div>
  );
}

/** The time to the tenth, as wide when it runs as when it stands. */
export function PlayerTime({ player }: { player: Player }) {
  const tenths = usePlayerState(player, (state) => Math.round(state.positionMs / 100));
  return <b className="tn ml-1.5 whitespace-nowrap">{formatTenths(tenths * 100)}</b>;
}

export function LoopButton({ player, span, name }: { player: Player; span: Span | null; name: string }) {
  const isOn = usePlayerState(player, (state) => state.loop !== null);
  return (
    <IconButton
      icon={Repeat2}
      label={isOn ? `Stop repeating ${name}` : `Repeat ${name}`}
      aria-pressed={isOn}
      aria-keyshortcuts="L"
      disabled={!span && !isOn}
      className={cx(
        isOn && 'bg-woadwash text-woad shadow-[inset_0_-3px_var(--color-woad)]',
        !span && !isOn && 'opacity-45',
      )}
      onClick={() => player.request({ kind: 'loop', span: isOn ? null : span })}
    />
  );
}

export function SpeedPicker({ player }: { player: Player }) {
  const speed = usePlayerState(player, (state) => state.speed);
  return (
    <select
      aria-label="Speed"
      value={speed}
      onChange={(event) => player.request({ kind: 'speed', speed: Number(event.target.value) })}
      className={cx(
        'h-[26px] cursor-pointer appearance-none rounded-2 bg-transparent px-1.5 text-center hover:bg-woadwash max-sm:h-11',
        speed === 1 ? 'text-walnut2' : 'font-bold text-woad',
      )}
    >
      {SPEEDS.map((one) => (
        <option key={one} value={one}>
          {one}×
        </option>
      ))}
    </select>
  );
}
