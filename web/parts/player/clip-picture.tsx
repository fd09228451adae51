import { type ReactNode, useCallback } from 'react';
import { type Player } from './create-player.ts';
import { usePlayerState } from './use-player.ts';

/**
 * The clip, without the browser's controls: ours stand under it. The caption is verbatim, in Lora italic on the picture.
 * Without a source, or with one that cannot be played, `children` says what is so and what to do.
 */
export function ClipPicture({
  player,
  src,
  caption,
  name,
  children,
}: {
  player: Player;
  src: string | null;
  caption: string;
  name: string;
  children: ReactNode;
}) {
  const media = usePlayerState(player, (state) => state.media);
  const attach = useCallback(
    (video: HTMLVideoElement | null) => {
      player.attach(video);
      return () => player.attach(null);
    },
    [player],
  );
  const isShown = src !== null && media !== 'failed';
  return (
    <div className="relative aspect-video overflow-hidden bg-cloth">
      {src !== null && (
        <video
          key={src}
          ref={attach}
          src={src}
          preload="metadata"
          playsInline
          aria-label={name}
          className={isShown ? 'size-full object-cover' : 'hidden'}
          onClick={() => player.request({ kind: 'toggle' })}
        />
      )}
      {!isShown && (
        <div className="cloth flex size-full flex-col items-center justify-center gap-1 px-6 text-center text-white">
          {children}
        </div>
      )}
      {caption && isShown && (
        <p
          className="said pointer-events-none absolute inset-x-0 bottom-2 mx-auto max-w-[36em] px-3 text-center text-white"
          style={{ textShadow: '0 0 3px #1b2426, 0 0 3px #1b2426, 0 1px 2px #1b2426' }}
        >
          {caption}
        </p>
      )}
    </div>
  );
}
