import { ChevronLeft, ChevronRight, Pause, Play, Repeat2 } from 'lucide-react';
import { useMemo } from 'react';
import { formatMoment } from '../lib/time.ts';
import { ClipPicture } from '../parts/player/clip-picture.tsx';
import { SpeedPicker } from '../parts/player/player-bar.tsx';
import { usePlayerState } from '../parts/player/use-player.ts';
import { Thread } from '../parts/thread/thread.tsx';
import { Button } from '../ui/button.tsx';
import { momentOf, lengthOf } from './moments.ts';
import { stepName } from './steps.ts';
import { useWatch } from './use-watch.ts';

/** The recording: clip, its controls, and the thread that runs along all of it. */
export function Stage() {
  const { edition } = useWatch();
  if (edition.recordings.length === 0) return <NoClip />;
  return (
    <>
      <Clip />
      <Controls />
      <RecordingThread />
    </>
  );
}

function NoClip() {
  return <p className="watch-no-clip">There is no clip with this pattern. The words are the whole of it.</p>;
}

function Clip() {
  const { edition, player, recordingNumber, state } = useWatch();
  const recording = edition.recordings.find(({ number }) => number === recordingNumber);
  const captions = useMemo(
    () => edition.captions.filter((caption) => caption.recordingNumber === recordingNumber),
    [edition, recordingNumber],
  );
  const at = usePlayerState(player, ({ positionMs }) =>
    captions.findIndex(({ startMs, endMs }) => positionMs >= startMs && positionMs < endMs),
  );
  const src = recording?.hasClip
    ? `/api/editions/${edition.code}/${edition.edition ?? 1}/clips/${recording.number}`
    : null;
  const elsewhere = recording?.publicUrl;
  return (
    <div className={state.mirrored ? 'watch-clip watch-mirrored' : 'watch-clip'}>
      <ClipPicture player={player} src={src} caption={captions[at]?.text ?? ''} name={recording?.title ?? 'Recording'}>
        <b>The clip is not here</b>
        <span>
          {elsewhere ? (
            <>
              It stands{' '}
              <a href={elsewhere} rel="noopener" className="underline">
                at another address
              </a>
              . The words serve.
            </>
          ) : (
            'The words of every round are below.'
          )}
        </span>
      </ClipPicture>
    </div>
  );
}

function Controls() {
  const { player, before, next, show, step, edition, act, state } = useWatch();
  const isPlaying = usePlayerState(player, (now) => now.isPlaying);
  const isLooping = usePlayerState(player, (now) => now.loop !== null);
  const seconds = usePlayerState(player, (now) => Math.floor(now.positionMs / 1000));
  const length = usePlayerState(player, (now) => Math.floor(now.durationMs / 1000));
  const moment = momentOf(edition, step.line);
  const name = stepName(step);
  return (
    <div role="group" aria-label="Player" className="watch-controls">
      <Button
        size="player"
        className="watch-desk"
        icon={ChevronLeft}
        disabled={!before}
        onClick={() => before && show(before)}
      >
        {before ? stepName(before) : 'first'}
        <span className="sr-only">, show it</span>
      </Button>
      <Button
        size="player"
        className="watch-play"
        icon={isPlaying ? Pause : Play}
        aria-keyshortcuts="Space"
        onClick={() => player.request({ kind: 'toggle' })}
      >
        <span className="sr-only">{isPlaying ? 'Pause' : 'Play'}</span>
        <span className="watch-phone tn" aria-hidden>
          {formatMoment(seconds * 1000)}
        </span>
      </Button>
      <Button size="player" className="watch-desk" disabled={!next} onClick={() => next && show(next)}>
        {next ? stepName(next) : 'last'}
        <span className="sr-only">, show it</span>
        <ChevronRight size={18} strokeWidth={1.4} aria-hidden />
      </Button>
      <span className="watch-desk watch-time">
        <b className="tn">{formatMoment(seconds * 1000)}</b> of {formatMoment(length * 1000)}
      </span>
      <span className="grow" />
      <Button
        size="player"
        icon={Repeat2}
        aria-pressed={isLooping}
        aria-keyshortcuts="L"
        {...(moment || isLooping ? {} : { notYet: 'This line has no moment in the recording.' })}
        onClick={() => player.request({ kind: 'loop', span: isLooping ? null : moment })}
      >
        Loop <span className="watch-desk">{name}</span>
      </Button>
      <SpeedPicker player={player} />
      <Button size="player" aria-pressed={state.mirrored} aria-keyshortcuts="X" onClick={() => act({ kind: 'mirror' })}>
        <MirrorDrawing />
        Mirror
      </Button>
    </div>
  );
}

/** Our own: a triangle and its mirror image on the two sides of a line. */
function MirrorDrawing() {
  return (
    <svg
      width="18"
      height="18"
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.8"
      strokeLinejoin="round"
      aria-hidden
    >
      <path d="M12 3v18" strokeDasharray="2.4 2.4" />
      <path d="M9 8v9H3Z" />
      <path d="M15 8v9h6Z" fill="currentColor" />
    </svg>
  );
}

function RecordingThread() {
  const { edition, player, recordingNumber, step, steps, show } = useWatch();
  const parts = useMemo(() => {
    const shown = edition.pieces.flatMap((piece) =>
      piece.lines
        .filter(({ mark }) => mark?.recordingNumber === recordingNumber)
        .map((line) => ({ piece, line, startMs: line.mark?.startMs ?? 0 })),
    );
    const knots = shown.map(({ line, piece, startMs }) => ({
      id: line.shortId,
      startMs,
      label: line.label.replace(/^(?:Rows? |R(?=\d))/, ''),
      name: `${piece.name}, ${line.label || 'step'}`,
    }));
    const pieces = edition.pieces.flatMap((piece) => {
      const starts = shown.filter((one) => one.piece === piece).map(({ startMs }) => startMs);
      return starts.length > 0 ? [{ name: piece.name, startMs: Math.min(...starts), endMs: Math.max(...starts) }] : [];
    });
    return { knots, pieces };
  }, [edition, recordingNumber]);
  return (
    <div className="watch-thread">
      <Thread
        player={player}
        durationMs={lengthOf(edition, recordingNumber)}
        knots={parts.knots}
        pieces={parts.pieces}
        speech={[]}
        openId={step.line.shortId}
        onOpen={(shortId) => {
          const to = steps.find(({ line }) => line.shortId === shortId);
          if (to) show(to);
        }}
      />
    </div>
  );
}
