import { type CSSProperties, useEffect, useRef } from 'react';
import { formatMoment, speakMoment } from '../../lib/time.ts';
import { useWidth } from '../../lib/use-width.ts';
import { type Player } from '../player/create-player.ts';
import { type Span } from '../player/player-state.ts';
import { usePlayerState } from '../player/use-player.ts';
import { KnotRow } from './knot-row.tsx';
import { Needle, Strands } from './strands.tsx';
import { Brackets, Speech } from './thread-lines.tsx';
import { type Knot } from './thread-knots.ts';

const PAD_PX = 24;
/** Under a fixed needle the thread runs at this length a second. */
const FIXED_PX_PER_MS = 1.15 / 1000;

export interface ThreadProps {
  player: Player;
  durationMs: number;
  knots: readonly Knot[];
  /** Where each piece lies, named in brackets below. */
  pieces: readonly (Span & { name: string })[];
  /** Where somebody speaks: the captions. */
  speech: readonly Span[];
  openId: string | null;
  onOpen: (knotId: string) => void;
  /** Left out where the moments may only be read. */
  onMove?: (knotId: string, toMs: number) => void;
  /** On a phone the needle stands still and the thread runs under it. */
  fixedNeedle?: boolean;
}

/** The whole recording as a thread: knots where something is marked, needle where the clip is. */
export function Thread({
  player,
  durationMs,
  knots,
  pieces,
  speech,
  openId,
  onOpen,
  onMove,
  fixedNeedle = false,
}: ThreadProps) {
  const [measure, width] = useWidth();
  const layer = useRef<HTMLDivElement>(null);
  const needle = useRef<SVGGElement>(null);
  const length = fixedNeedle ? durationMs * FIXED_PX_PER_MS : Math.max(0, width - 2 * PAD_PX);
  const pxPerMs = durationMs > 0 ? length / durationMs : 0;
  const height = fixedNeedle ? 64 : 94;
  const y = fixedNeedle ? 38 : 41;

  useEffect(() => {
    const place = () => {
      const x = player.getState().positionMs * pxPerMs;
      if (layer.current) layer.current.style.transform = `translateX(${fixedNeedle ? width / 2 - x : PAD_PX}px)`;
      needle.current?.setAttribute('transform', `translate(${x} 0)`);
      for (const part of layer.current?.querySelectorAll('[data-played]') ?? [])
        part.setAttribute('width', String(Math.max(0, x)));
    };
    place();
    return player.subscribe(place);
  }, [player, pxPerMs, width, fixedNeedle]);

  const style = { height, '--thread-ground': 'var(--color-chalk)' } as CSSProperties;
  return (
    <div ref={measure} className="relative touch-pan-y overflow-hidden bg-chalk select-none" style={style}>
      <div ref={layer} className="absolute inset-0">
        <svg width={length + 8} height={height} className="absolute overflow-visible" aria-hidden>
          <Strands width={length} y={y} played={0} />
          {!fixedNeedle && <Brackets pieces={pieces} pxPerMs={pxPerMs} y={y + 12} />}
          {!fixedNeedle && <Speech spans={speech} pxPerMs={pxPerMs} y={height - 10} />}
          {!fixedNeedle && (
            <g ref={needle}>
              <Needle y={y} />
            </g>
          )}
        </svg>
        <Track player={player} durationMs={durationMs} length={length} pxPerMs={pxPerMs} y={y} isFixed={fixedNeedle} />
        <KnotRow
          player={player}
          knots={knots}
          pxPerMs={pxPerMs}
          y={y}
          big={fixedNeedle ? 1.17 : 1}
          openId={openId}
          onOpen={onOpen}
          snaps={speech}
          {...(onMove ? { onMove } : {})}
        />
      </div>
      {fixedNeedle && (
        <svg
          width="10"
          height={height}
          viewBox={`-5 0 10 ${height}`}
          className="absolute top-0 left-1/2 -ml-[5px]"
          aria-hidden
        >
          <Needle y={y} big={1.6} />
        </svg>
      )}
    </div>
  );
}

interface TrackProps {
  player: Player;
  durationMs: number;
  length: number;
  pxPerMs: number;
  y: number;
  isFixed: boolean;
}

/** What is pressed and dragged to go elsewhere in the clip; to a keyboard a slider. */
function Track({ player, durationMs, length, pxPerMs, y, isFixed }: TrackProps) {
  const seconds = usePlayerState(player, (state) => Math.floor(state.positionMs / 1000));
  const from = useRef<{ x: number; ms: number } | null>(null);
  const go = (event: React.PointerEvent<HTMLDivElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const start = from.current;
    const toMs =
      isFixed && start ? start.ms - (event.clientX - start.x) / pxPerMs : (event.clientX - box.left) / pxPerMs;
    player.request({ kind: 'seek', toMs });
  };
  const step: Record<string, number> = { ArrowLeft: -1000, ArrowRight: 1000, ArrowDown: -5000, ArrowUp: 5000 };
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label="Place in the recording"
      aria-valuemin={0}
      aria-valuemax={Math.round(durationMs / 1000)}
      aria-valuenow={seconds}
      aria-valuetext={speakMoment(seconds * 1000)}
      title={formatMoment(durationMs)}
      className="absolute h-[34px] cursor-pointer"
      style={{ top: y - 17, left: -6, width: length + 12 }}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        from.current = { x: event.clientX, ms: player.getState().positionMs };
        if (!isFixed) go(event);
      }}
      onPointerMove={(event) => from.current && go(event)}
      onPointerUp={() => (from.current = null)}
      onPointerCancel={() => (from.current = null)}
      onKeyDown={(event) => {
        const by = step[event.key];
        if (by === undefined) return;
        event.preventDefault();
        player.request({ kind: 'step', byMs: event.shiftKey ? by / 10 : by });
      }}
    />
  );
}
