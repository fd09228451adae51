import { Lock, Trash2 } from 'lucide-react';
import { type ReactNode } from 'react';
import type { Caution } from '#contract/pattern-details';
import { Button, IconButton } from '../../ui/button.tsx';
import { Icon } from '../../ui/icon.tsx';
import { KeptField } from '../../ui/kept-field.tsx';
import type { SheetDesk } from './sheet-desk.ts';

function Ledger({
  id,
  title,
  onAdd,
  add,
  children,
}: {
  id: string;
  title: string;
  add: string;
  onAdd: (() => void) | null;
  children: ReactNode;
}) {
  return (
    <section aria-labelledby={id} className="border-b border-rule">
      <div className="panel-head justify-between">
        <h2 id={id} className="h-panel">
          {title}
        </h2>
        {onAdd && (
          <Button size="row" onClick={onAdd}>
            {add}
          </Button>
        )}
      </div>
      {children}
    </section>
  );
}

const Row = ({ children }: { children: ReactNode }) => (
  <li className="flex items-start gap-2 border-b border-feint px-3.5 py-2">{children}</li>
);

/** Notes: right side out, how chains turn, and whatever else must be known before starting. */
export function NotesLedger({ desk }: { desk: SheetDesk }) {
  const { notes, mayEdit } = desk.pattern;
  return (
    <Ledger
      id="sheet-notes"
      title="Notes"
      add="Add note"
      onAdd={mayEdit ? () => desk.add('note', { text: 'New note' }) : null}
    >
      <ul>
        {notes.map(({ id, text }, i) => (
          <Row key={id}>
            <div className="flex-1">
              <KeptField
                label={`Note ${i + 1}`}
                hideLabel
                lines={2}
                value={text}
                maxLength={2_000}
                disabled={!mayEdit}
                onSave={(next) => next.trim() !== '' && desk.edit('note', id, { text: next })}
              />
            </div>
            {mayEdit && (
              <IconButton icon={Trash2} label={`Remove note ${i + 1}`} onClick={() => desk.remove('note', id)} />
            )}
          </Row>
        ))}
      </ul>
    </Ledger>
  );
}

/** Stitches that the pattern defines; its lines may use them like any other. */
export function StitchesLedger({ desk }: { desk: SheetDesk }) {
  const { specialStitches, mayEdit } = desk.pattern;
  const add = () => desk.add('special-stitch', { name: 'Shell', abbreviation: 'sh', text: '5 dc in one st' });
  return (
    <Ledger id="sheet-stitches" title="Special stitches" add="Add stitch" onAdd={mayEdit ? add : null}>
      <ul>
        {specialStitches.map(({ id, name, abbreviation, text }) => (
          <Row key={id}>
            <div className="w-32">
              <KeptField
                label="Name"
                value={name}
                maxLength={120}
                disabled={!mayEdit}
                onSave={(next) => next.trim() !== '' && desk.edit('special-stitch', id, { name: next })}
              />
            </div>
            <div className="w-16">
              <KeptField
                label="Short"
                value={abbreviation}
                maxLength={30}
                disabled={!mayEdit}
                onSave={(next) => desk.edit('special-stitch', id, { abbreviation: next })}
              />
            </div>
            <div className="flex-1">
              <KeptField
                label="How it is worked"
                value={text}
                maxLength={2_000}
                disabled={!mayEdit}
                onSave={(next) => next.trim() !== '' && desk.edit('special-stitch', id, { text: next })}
              />
            </div>
            {mayEdit && (
              <IconButton
                icon={Trash2}
                label={`Remove ${name}`}
                className="mt-6"
                onClick={() => desk.remove('special-stitch', id)}
              />
            )}
          </Row>
        ))}
      </ul>
    </Ledger>
  );
}

/** Cautions in the double frame. One that something brings can be worded anew and goes only when that goes. */
export function CautionsLedger({ desk }: { desk: SheetDesk }) {
  const { cautions, mayEdit } = desk.pattern;
  const add = () => desk.add('caution', { kind: 'own', text: 'Sew every part on twice.' });
  return (
    <Ledger id="sheet-cautions" title="Cautions" add="Add caution" onAdd={mayEdit ? add : null}>
      <div className="p-3.5">
        <ul className="double-frame grid gap-3 bg-sheet">
          {cautions.map((caution) => (
            <CautionRow key={caution.id ?? caution.kind} caution={caution} desk={desk} />
          ))}
          <li className="text-walnut2">
            The rules where you live apply to you as the maker: this stands on every sheet and is not a certificate.
          </li>
        </ul>
      </div>
    </Ledger>
  );
}

function CautionRow({ caution, desk }: { caution: Caution; desk: SheetDesk }) {
  const { id, kind, text, broughtBy } = caution;
  const isBrought = broughtBy.length > 0;
  const reword = (next: string) => {
    if (next.trim() === '') return;
    if (id === null) desk.add('caution', { kind, text: next });
    else desk.edit('caution', id, { text: next });
  };
  return (
    <li className="flex items-start gap-2">
      <div className="flex-1">
        <KeptField
          label={isBrought ? `Brought by ${broughtBy.join(', ')}` : 'Your own'}
          lines={3}
          value={text}
          maxLength={1_000}
          disabled={!desk.pattern.mayEdit}
          onSave={reword}
        />
      </div>
      {isBrought ? (
        <span className="mt-7 text-walnut2" title="Reword only: it goes when what brings it goes">
          <Icon of={Lock} size={16} />
        </span>
      ) : (
        id !== null &&
        desk.pattern.mayEdit && (
          <IconButton
            icon={Trash2}
            label="Remove this caution"
            className="mt-6"
            onClick={() => desk.remove('caution', id)}
          />
        )
      )}
    </li>
  );
}
