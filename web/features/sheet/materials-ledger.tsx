import { Trash2 } from 'lucide-react';
import { hookLabel, YARN_WEIGHTS } from '#crochet';
import type { Material } from '#contract/pattern-details';
import { Button, IconButton } from '../../ui/button.tsx';
import { SelectField } from '../../ui/field.tsx';
import { KeptField } from '../../ui/kept-field.tsx';
import type { SheetDesk } from './sheet-desk.ts';

const KINDS = { yarn: 'Yarn', hook: 'Hook', notion: 'Notion', filling: 'Filling' } as const;

/** Yarn, hook, notions and filling: a row each. What brings a caution brings it by itself. */
export function MaterialsLedger({ desk }: { desk: SheetDesk }) {
  const { materials, mayEdit } = desk.pattern;
  return (
    <section aria-labelledby="sheet-materials" className="border-b border-rule">
      <div className="panel-head flex-wrap justify-between gap-y-1.5 py-1.5">
        <h2 id="sheet-materials" className="h-panel">
          Materials
        </h2>
        <span className="flex flex-wrap gap-2">
          {mayEdit &&
            (Object.keys(KINDS) as (keyof typeof KINDS)[]).map((kind) => (
              <Button key={kind} size="row" onClick={() => desk.add('material', { kind, name: KINDS[kind] })}>
                Add {KINDS[kind].toLowerCase()}
              </Button>
            ))}
        </span>
      </div>
      {materials.length === 0 && (
        <p className="px-3.5 py-3 text-walnut2">
          Nothing yet. A sheet wants a yarn with its weight, and a hook in millimetres.
        </p>
      )}
      <ul>
        {materials.map((material) => (
          <MaterialRow key={material.id} material={material} desk={desk} />
        ))}
      </ul>
    </section>
  );
}

/** A number as typed, or undefined where it is none in range: then it is left out, not saved wrong. */
function numberIn(text: string, max: number): number | undefined {
  const n = Number(text.trim().replace(',', '.'));
  return text.trim() !== '' && Number.isFinite(n) && n > 0 && n <= max ? n : undefined;
}

function MaterialRow({ material, desk }: { material: Material; desk: SheetDesk }) {
  const { id, kind, name, details } = material;
  const disabled = !desk.pattern.mayEdit;
  const set = (part: Partial<Material['details']>) => {
    const next = Object.fromEntries(
      Object.entries({ ...details, ...part }).filter(([, value]) => value !== undefined && value !== ''),
    );
    desk.edit('material', id, { details: next });
  };
  const hook = kind === 'hook' && details.sizeMm !== undefined ? hookLabel(details.sizeMm) : '';
  const sized = kind === 'hook' || kind === 'notion';
  return (
    <li className="flex flex-wrap items-end gap-2 border-b border-feint px-3.5 py-2">
      <span className="w-14 pb-2 font-bold">{KINDS[kind]}</span>
      <div className="min-w-[150px] flex-1">
        <KeptField
          label="Name"
          value={name}
          maxLength={200}
          disabled={disabled}
          onSave={(text) => text.trim() !== '' && desk.edit('material', id, { name: text })}
        />
      </div>
      {kind === 'yarn' && (
        <>
          <div className="w-28">
            <KeptField
              label="Colour"
              value={details.colour ?? ''}
              maxLength={120}
              disabled={disabled}
              onSave={(colour) => set({ colour })}
            />
          </div>
          <div className="w-36">
            <SelectField
              label="Weight"
              disabled={disabled}
              value={details.weight ?? ''}
              onChange={({ target }) => set({ weight: target.value === '' ? undefined : Number(target.value) })}
            >
              <option value="">not said</option>
              {YARN_WEIGHTS.map((weight) => (
                <option key={weight.number} value={weight.number}>
                  {weight.number}, {weight.name}
                </option>
              ))}
            </SelectField>
          </div>
        </>
      )}
      {sized && (
        <div className="w-20">
          <KeptField
            label="mm"
            value={details.sizeMm === undefined ? '' : String(details.sizeMm)}
            maxLength={6}
            inputMode="decimal"
            disabled={disabled}
            onSave={(text) => set({ sizeMm: numberIn(text, 100) })}
          />
        </div>
      )}
      {hook !== '' && <span className="min-w-28 pb-2 text-walnut2">{hook}</span>}
      {kind !== 'hook' && (
        <div className="w-28">
          <KeptField
            label="Amount"
            value={details.amount ?? ''}
            maxLength={120}
            disabled={disabled}
            onSave={(amount) => set({ amount })}
          />
        </div>
      )}
      {!disabled && (
        <IconButton
          icon={Trash2}
          label={`Remove ${name}`}
          className="mb-1"
          onClick={() => desk.remove('material', id)}
        />
      )}
    </li>
  );
}
