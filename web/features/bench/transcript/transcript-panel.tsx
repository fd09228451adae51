import { type Caption } from './captions.ts';
import { type ChosenWords } from './choose-words.ts';
import { useChosenWords } from './use-chosen-words.ts';
import { WordsBar } from './words-bar.tsx';
import { Search } from 'lucide-react';
import { type RefObject, useMemo, useRef, useState } from 'react';
import { usePlayerState } from '../../../parts/player/use-player.ts';
import { useStable } from '../../../lib/use-stable.ts';
import { Button } from '../../../ui/button.tsx';
import { useDesk } from '../desk/use-desk.ts';
import { CaptionRow } from './caption-row.tsx';
import { type Cues } from '../cues.queries.ts';
import { findCaptions, lastBegun } from './captions.ts';
import { FindBar } from './find-bar.tsx';
import { NoTranscript } from './no-transcript.tsx';
import { RecordingPicker } from './recording-picker.tsx';
import { useFollow } from './use-follow.ts';

/** Whether some of the chosen words stand in a caption. */
const touches = ({ words }: Caption, { firstWord, lastWord }: ChosenWords) =>
  words.some(({ n }) => n >= firstWord && n <= lastWord);

/** What was said, following the clip. Evidence is underlined and leads to its line; any word leads to its moment. */
export function TranscriptPanel({
  isFinding,
  onFind,
  field,
  cues,
}: {
  isFinding: boolean;
  onFind: (on: boolean) => void;
  field: RefObject<HTMLInputElement | null>;
  cues: Cues;
}) {
  const { captions, senses, player, moments, lineId, pick, chosenWords } = useDesk();
  const list = useRef<HTMLOListElement>(null);
  useChosenWords(list);
  const [needle, setNeedle] = useState('');
  const [foundAt, setFoundAt] = useState(0);
  const found = useMemo(() => findCaptions(captions, isFinding ? needle : ''), [captions, needle, isFinding]);
  const hit = found[foundAt % Math.max(1, found.length)];

  const spokenAt = usePlayerState(player, (state) => lastBegun(captions, state.positionMs));
  const shownAt = hit ?? spokenAt;
  const { isFollowing, follow, byHand } = useFollow(list, captions[shownAt]?.id ?? null);

  const knots = useMemo(() => {
    const byCaption = new Map<number, string | null>();
    for (const mark of moments) byCaption.set(Math.max(0, lastBegun(captions, mark.startMs + 400)), mark.lineId);
    return byCaption;
  }, [captions, moments]);

  const onSeek = useStable((toMs: number) => player.request({ kind: 'seek', toMs }));
  const onSense = useStable((id: string, atMs: number) => {
    player.request({ kind: 'seek', toMs: atMs });
    pick(id, true);
  });

  return (
    <section aria-labelledby="transcript-heading" className="flex min-h-0 min-w-0 flex-col border-r border-rule">
      <div className="panel-head gap-2">
        <h2 id="transcript-heading" className={isFinding ? 'sr-only' : 'h-panel'}>
          Transcript
        </h2>
        {isFinding ? (
          <FindBar
            needle={needle}
            count={found.length}
            at={foundAt % Math.max(1, found.length)}
            field={field}
            onType={(text) => {
              setNeedle(text);
              setFoundAt(0);
              follow();
            }}
            onWalk={(way) => {
              setFoundAt((at) => (at + way + found.length) % Math.max(1, found.length));
              follow();
            }}
            onClose={() => onFind(false)}
          />
        ) : (
          <>
            {captions.length > 0 &&
              (isFollowing ? (
                <span className="text-walnut2">follows the clip</span>
              ) : (
                <button type="button" className="link" onClick={follow}>
                  Follow again
                </button>
              ))}
            <Button
              kind="quiet"
              size="row"
              icon={Search}
              keys={['/']}
              className="ml-auto text-walnut2! [&>svg]:size-4"
              onClick={() => onFind(true)}
            >
              Find
            </Button>
          </>
        )}
      </div>
      <RecordingPicker />
      {captions.length === 0 ? (
        <NoTranscript cues={cues} />
      ) : (
        <ol
          ref={list}
          {...byHand}
          tabIndex={0}
          aria-label="What was said"
          className="relative min-h-0 grow overflow-y-auto bg-sheet py-2"
        >
          {captions.map((caption, i) => (
            <CaptionRow
              key={caption.id}
              caption={caption}
              senses={senses}
              isSpoken={i === spokenAt}
              isPast={i < spokenAt}
              isStop={i === Math.max(0, spokenAt)}
              knot={knots.has(i) ? (knots.get(i) === lineId && lineId !== null ? 'chosen' : 'other') : null}
              lineId={lineId}
              found={hit === undefined ? null : i === hit ? 'here' : 'elsewhere'}
              chosen={chosenWords && touches(caption, chosenWords) ? chosenWords : null}
              onSeek={onSeek}
              onSense={onSense}
            />
          ))}
        </ol>
      )}
      {chosenWords && <WordsBar words={chosenWords} />}
    </section>
  );
}
