import { MapPin } from 'lucide-react';
import { type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { type PatternRecording } from '#contract/patterns';
import { formatBytes } from '../../../lib/time.ts';
import { paths } from '../../../lib/paths.ts';
import { ClipPicture } from '../../../parts/player/clip-picture.tsx';
import { PlayerBar } from '../../../parts/player/player-bar.tsx';
import { usePlayerState } from '../../../parts/player/use-player.ts';
import { Button } from '../../../ui/button.tsx';
import { markAtPlayhead } from '../desk/marking.ts';
import { loopSpan, mainMark } from '../desk/moments.ts';
import { lineName } from '../desk/line-name.ts';
import { type Desk, lineOf, useDesk } from '../desk/use-desk.ts';
import { walkCaptions } from '../desk/walking.ts';
import { lastBegun } from '../transcript/captions.ts';

/** What the loop repeats, and its name. */
export function loopOf(desk: Desk) {
  const line = lineOf(desk, desk.lineId);
  const mark = line && mainMark(desk.pattern.marks, line.id);
  const isHere = mark?.recordingId === desk.recordingId;
  return { span: isHere ? loopSpan(mark, desk.moments, desk.lastMs) : null, name: line ? lineName(line) : 'the line' };
}

/** The picture with what is being said on it, and what is so when there is none. */
export function Clip() {
  const { pattern, recordingId, player, captions } = useDesk();
  const recording = pattern.recordings.find((one) => one.id === recordingId);
  const caption = usePlayerState(player, ({ positionMs }) => {
    const spoken = captions[lastBegun(captions, positionMs)];
    return spoken && positionMs < spoken.endMs ? spoken.text : '';
  });
  const hasFailed = usePlayerState(player, (state) => state.media === 'failed');
  return (
    <ClipPicture
      player={player}
      src={recording?.clip?.url ?? null}
      caption={caption}
      name={`Clip of ${recording?.title ?? pattern.title}`}
    >
      <NoPicture patternId={pattern.id} recording={recording} hasFailed={hasFailed} />
    </ClipPicture>
  );
}

function NoPicture({
  patternId,
  recording,
  hasFailed,
}: {
  patternId: string;
  recording: PatternRecording | undefined;
  hasFailed: boolean;
}): ReactNode {
  const link = 'border-b border-clothlink font-medium text-clothlink';
  const { clip, publicUrl } = recording ?? {};
  if (hasFailed) {
    return (
      <>
        <b>This browser cannot play the clip.</b>
        <span className="small text-oncloth">It is kept. Export it as MP4 with H.264 and put that in its place.</span>
        <Link to={paths.recording(patternId)} className={link}>
          Change the clip
        </Link>
      </>
    );
  }
  if (clip?.state === 'arriving') {
    return (
      <>
        <b>The clip is not here yet.</b>
        <span className="small text-oncloth">
          {formatBytes(clip.bytes)} are going up. The transcript keeps the time meanwhile.
        </span>
      </>
    );
  }
  if (publicUrl) {
    return (
      <>
        <b>This recording stands elsewhere.</b>
        <a href={publicUrl} target="_blank" rel="noreferrer" className={link}>
          Open it beside this
        </a>
      </>
    );
  }
  return (
    <>
      <b>No clip yet.</b>
      <span className="small text-oncloth">
        {recording?.transcriptId ? 'The transcript keeps the time.' : 'Lines can be written without.'}
      </span>
      <Link to={paths.recording(patternId)} className={link}>
        Add the clip
      </Link>
    </>
  );
}

/** Controls under the picture. */
export function ClipBar() {
  const desk = useDesk();
  const { span, name } = loopOf(desk);
  return (
    <PlayerBar
      player={desk.player}
      loopSpan={span}
      loopName={name}
      onBefore={() => walkCaptions(desk, -1)}
      onNext={() => walkCaptions(desk, 1)}
    >
      {desk.pattern.mayEdit && (
        <Button
          size="row"
          keys={['M']}
          icon={MapPin}
          className="ml-1 px-2! [&>svg]:hidden"
          onClick={() => markAtPlayhead(desk)}
        >
          Mark
        </Button>
      )}
    </PlayerBar>
  );
}
