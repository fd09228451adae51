import { ArrowDown, ArrowUp, Copy, CornerDownRight, CornerUpRight, History, Trash2 } from 'lucide-react';
import { useState } from 'react';
import { type Line, type LineEdit, LineKind } from '#contract/rows';
import { Button } from '../../../ui/button.tsx';
import { Field, SelectField } from '../../../ui/field.tsx';
import { lineName } from '../desk/line-name.ts';
import { useDesk } from '../desk/use-desk.ts';
import { LineHistory } from '../history/line-history.tsx';
import { addLineAbove, addLineAfter, deleteLine, duplicateLine, moveLine } from './line-deeds.ts';

const KIND_WORDS: Record<Line['kind'], string> = {
  foundation: 'foundation',
  round: 'round',
  row: 'row',
  step: 'step',
  note: 'note',
};

const wholeOr = (text: string): number | null => (/^\d{1,4}$/.test(text.trim()) ? Number(text) : null);

/** What is rarely needed of the open line: what it is and its numbers, a note, and its place among the others. */
export function LineTools({ line }: { line: Line }) {
  const desk = useDesk();
  const [hasHistory, setHistory] = useState(false);
  const editLine = (id: string, edit: LineEdit) => desk.bench.edit('line', id, edit);
  const isNumbered = line.kind === 'round' || line.kind === 'row';
  const name = lineName(line) || KIND_WORDS[line.kind];
  return (
    <div className="border-t border-feint py-3">
      <div className="mb-3 flex flex-wrap items-end gap-3">
        <div className="w-32">
          <SelectField
            label="What it is"
            value={line.kind}
            onChange={(event) => editLine(line.id, { kind: LineKind.parse(event.target.value) })}
          >
            {LineKind.options.map((kind) => (
              <option key={kind} value={kind}>
                {KIND_WORDS[kind]}
              </option>
            ))}
          </SelectField>
        </div>
        {isNumbered ? (
          <>
            <NumberField
              label="From"
              value={line.from}
              onChange={(from) => editLine(line.id, { from, to: Math.max(from ?? 0, line.to ?? 0) || null })}
            />
            <NumberField label="To" value={line.to} onChange={(to) => editLine(line.id, { to })} />
          </>
        ) : (
          <div className="w-40">
            <Field
              label="Its name"
              value={line.label}
              onChange={(event) => editLine(line.id, { label: event.target.value })}
            />
          </div>
        )}
        <div className="min-w-48 grow">
          <Field
            label="Note, printed under it"
            value={line.note}
            onChange={(event) => editLine(line.id, { note: event.target.value })}
          />
        </div>
      </div>
      <div className="flex flex-wrap gap-1.5" role="group" aria-label={`Place of ${name}`}>
        <Button size="row" icon={CornerUpRight} onClick={() => addLineAbove(desk, line)}>
          Add above
        </Button>
        <Button size="row" icon={CornerDownRight} onClick={() => addLineAfter(desk, line.pieceId, line.id)}>
          Add below
        </Button>
        <Button size="row" icon={Copy} onClick={() => duplicateLine(desk, line)}>
          Duplicate
        </Button>
        <Button
          size="row"
          icon={ArrowUp}
          keys={['Alt', '↑']}
          aria-label="Move up"
          onClick={() => moveLine(desk, line, -1)}
        >
          Up
        </Button>
        <Button
          size="row"
          icon={ArrowDown}
          keys={['Alt', '↓']}
          aria-label="Move down"
          onClick={() => moveLine(desk, line, 1)}
        >
          Down
        </Button>
        <Button size="row" icon={History} aria-expanded={hasHistory} onClick={() => setHistory(!hasHistory)}>
          From the start
        </Button>
        <Button
          size="row"
          kind="harm"
          icon={Trash2}
          className="ml-auto"
          onClick={() => {
            deleteLine(desk, line);
            desk.tellDone(`${name} deleted`);
          }}
        >
          Delete
        </Button>
      </div>
      {hasHistory && (
        <div className="mt-3 border-t border-feint pt-2">
          <LineHistory line={line} />
        </div>
      )}
    </div>
  );
}

function NumberField({
  label,
  value,
  onChange,
}: {
  label: string;
  value: number | null;
  onChange: (n: number | null) => void;
}) {
  return (
    <div className="w-16">
      <Field
        label={label}
        inputMode="numeric"
        className="tn text-right"
        value={value ?? ''}
        onChange={(event) => onChange(wholeOr(event.target.value))}
      />
    </div>
  );
}
