import { useId, useState } from 'react';
import { type Line, type Piece, Worked } from '#contract/rows';
import { Button } from '../../../ui/button.tsx';
import { Field } from '../../../ui/field.tsx';
import { Switch } from '../../../ui/switch.tsx';
import { pieceStitches } from '../desk/bench-count.ts';
import { useDesk } from '../desk/use-desk.ts';

const WORKED_WORDS: Record<Piece['worked'], string> = {
  spiral: 'worked in a spiral',
  joined: 'worked in joined rounds',
  rows: 'worked in rows',
};
const WORKED_SHORT: Record<Piece['worked'], string> = { spiral: 'spiral', joined: 'joined', rows: 'rows' };

/** A piece's name in Lora, how many of it and how it is worked, and what it comes to. Pressed, it can be changed. */
export function PieceHead({ piece, lines }: { piece: Piece; lines: readonly Line[] }) {
  const { pattern, counts } = useDesk();
  const [isOpen, setOpen] = useState(false);
  const stitches = pieceStitches(lines, counts);
  const words = `make ${piece.make}, ${WORKED_WORDS[piece.worked]}`;
  return (
    <>
      <div className="flex min-h-[33px] items-center gap-2.5 border-b border-rule px-3.5">
        <h3 className="h-piece">{piece.name}</h3>
        {pattern.mayEdit ? (
          <button
            type="button"
            aria-expanded={isOpen}
            className="text-walnut2 hover:text-woad"
            onClick={() => setOpen(!isOpen)}
          >
            {words}
          </button>
        ) : (
          <span className="text-walnut2">{words}</span>
        )}
        <span className="ml-auto whitespace-nowrap text-walnut2">
          {stitches === null ? '' : `${stitches} stitches${piece.make > 1 ? ' each' : ''}`}
        </span>
      </div>
      {isOpen && <PieceTools piece={piece} isEmpty={lines.length === 0} onDone={() => setOpen(false)} />}
    </>
  );
}

function PieceTools({ piece, isEmpty, onDone }: { piece: Piece; isEmpty: boolean; onDone: () => void }) {
  const { bench, pattern, tellDone } = useDesk();
  const labelId = useId();
  const others = pattern.pieces.length > 1;
  return (
    <div className="bar flex flex-wrap items-end gap-3.5 border-b border-rule bg-chalk px-3.5 py-3">
      <div className="w-44">
        <Field
          label="Piece"
          defaultValue={piece.name}
          onChange={(event) =>
            event.target.value.trim() && bench.edit('piece', piece.id, { name: event.target.value.trim() })
          }
        />
      </div>
      <div className="w-16">
        <Field
          label="Make"
          inputMode="numeric"
          className="tn text-right"
          defaultValue={piece.make}
          onChange={(event) =>
            /^[1-9]\d{0,2}$/.test(event.target.value) &&
            bench.edit('piece', piece.id, { make: Number(event.target.value) })
          }
        />
      </div>
      <div>
        <span id={labelId} className="label">
          Worked in
        </span>
        <Switch
          label="Worked in"
          value={piece.worked}
          options={Worked.options.map((value) => ({ value, label: WORKED_SHORT[value] }))}
          onChange={(worked) => bench.edit('piece', piece.id, { worked })}
        />
      </div>
      <span className="grow" />
      {others && (
        <Button
          kind="harm"
          onClick={() => {
            bench.remove('piece', piece.id);
            tellDone(`${piece.name} deleted${isEmpty ? '' : ', with its lines'}`);
          }}
        >
          Delete the piece
        </Button>
      )}
      <Button onClick={onDone}>Done</Button>
    </div>
  );
}
