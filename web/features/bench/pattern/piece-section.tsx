import { SortableContext, verticalListSortingStrategy } from '@dnd-kit/sortable';
import { Plus } from 'lucide-react';
import { type Piece } from '#contract/rows';
import { usePlayerState } from '../../../parts/player/use-player.ts';
import { ONE_COLUMN, useMedia } from '../../../lib/use-media.ts';
import { useStable } from '../../../lib/use-stable.ts';
import { Button } from '../../../ui/button.tsx';
import { lineName } from '../desk/line-name.ts';
import { mainMark } from '../desk/moments.ts';
import { useDesk } from '../desk/use-desk.ts';
import { lastBegun } from '../transcript/captions.ts';
import { PhoneLine } from '../phone/phone-line.tsx';
import { PhoneOpenLine } from '../phone/phone-open-line.tsx';
import { addLineAfter } from './line-deeds.ts';
import { LineRow } from './line-row.tsx';
import { OpenLine } from './open-line.tsx';
import { PieceHead } from './piece-head.tsx';
import { SortableLine } from './sortable-line.tsx';

/** Which line the clip is at, so far as moments tell. */
export function usePlayingLine(): string | null {
  const { player, moments } = useDesk();
  return usePlayerState(player, (state) =>
    state.isPlaying ? (moments[lastBegun(moments, state.positionMs)]?.lineId ?? null) : null,
  );
}

/** A piece: its name, how it is worked, its lines. */
export function PieceSection({ piece }: { piece: Piece }) {
  const desk = useDesk();
  const { pattern, counts, lineId, isOpen, pick, goTo } = desk;
  const lines = pattern.lines.filter((line) => line.pieceId === piece.id);
  const playing = usePlayingLine();
  const isPhone = useMedia(ONE_COLUMN);
  const [Row, Open] = isPhone ? ([PhoneLine, PhoneOpenLine] as const) : ([LineRow, OpenLine] as const);
  const onPick = useStable((id: string) => {
    pick(id, true);
    goTo(id);
  });
  return (
    <div role="group" aria-label={piece.name}>
      <PieceHead piece={piece} lines={lines} />
      <SortableContext items={lines.map((line) => line.id)} strategy={verticalListSortingStrategy}>
        <ol>
          {lines.map((line) => {
            const one = counts.get(line.id);
            const followed = one?.follows ? pattern.lines.find((other) => other.id === one.follows?.line) : undefined;
            const follows = followed && lineName(followed);
            return (
              <SortableLine key={line.id} id={line.id} name={lineName(line) || line.kind} canMove={pattern.mayEdit}>
                {isOpen && line.id === lineId ? (
                  <Open line={line} count={one} follows={follows} />
                ) : (
                  <Row
                    line={line}
                    count={one}
                    follows={follows}
                    atMs={mainMark(pattern.marks, line.id)?.startMs ?? null}
                    isInHand={line.id === lineId}
                    isPlaying={line.id === playing}
                    onPick={onPick}
                  />
                )}
              </SortableLine>
            );
          })}
        </ol>
      </SortableContext>
      {pattern.mayEdit && (
        <div className="border-b border-feint px-2 py-0.5">
          <Button
            kind="quiet"
            size="row"
            icon={Plus}
            className="[&>svg]:size-4"
            onClick={() => addLineAfter(desk, piece.id, lines.at(-1)?.id ?? null)}
          >
            {lines.length === 0 ? 'Write its first line' : 'Add a line'}
          </Button>
        </div>
      )}
    </div>
  );
}
