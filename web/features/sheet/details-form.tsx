import type { Details } from '#contract/pattern-details';
import { TickBox } from '../../ui/field.tsx';
import { Switch } from '../../ui/switch.tsx';
import { KeptField } from '../../ui/kept-field.tsx';
import type { SheetDesk } from './sheet-desk.ts';

const LEVELS = [
  { value: 'none', label: 'Not said' },
  { value: 'basic', label: 'Basic' },
  { value: 'easy', label: 'Easy' },
  { value: 'intermediate', label: 'Intermediate' },
  { value: 'complex', label: 'Complex' },
] as const;

const USES: readonly (readonly [Details['uses'][number], string])[] = [
  ['hot', 'will be hot'],
  ['carried', 'will be carried'],
  ['sleep', 'is slept near'],
  ['chewed', 'may be chewed'],
  ['pet', 'is for a pet'],
];

type Words = Exclude<keyof Details, 'level' | 'uses'>;

/** What the sheet says round the lines: one ledger of fields, each saved as it is typed. */
export function DetailsForm({ desk }: { desk: SheetDesk }) {
  const { details, mayEdit } = desk.pattern;
  const save = (fields: Partial<Details>) => desk.editPattern({ details: fields });
  const words = (name: Words, label: string, maxLength: number, more: { lines?: number; hint?: string } = {}) => (
    <KeptField
      label={label}
      value={details[name]}
      maxLength={maxLength}
      disabled={!mayEdit}
      {...more}
      onSave={(text) => save({ [name]: text })}
    />
  );
  return (
    <section aria-labelledby="sheet-words" className="border-b border-rule">
      <div className="panel-head">
        <h2 id="sheet-words" className="h-panel">
          Words
        </h2>
      </div>
      <div className="grid gap-3 p-3.5">
        {words('introduction', 'Introduction', 4_000, {
          lines: 3,
          hint: 'What it is and how large. Short ones stand under the title.',
        })}
        <div className="grid grid-cols-2 gap-3 max-sm:grid-cols-1">
          {words('gauge', 'Gauge', 300, { lines: 2 })}
          {words('finishedSize', 'Finished size, as measured', 300, { lines: 2 })}
        </div>
        <div className="flex flex-wrap items-center gap-2">
          <span className="label mb-0!">Level</span>
          <div className="max-w-full overflow-x-auto p-0.5">
            <Switch
              label="Level"
              value={details.level ?? 'none'}
              options={LEVELS}
              onChange={(level) => save({ level: level === 'none' ? null : level })}
            />
          </div>
        </div>
        <fieldset>
          <legend className="label">The finished piece</legend>
          <div className="flex flex-wrap gap-x-5 gap-y-1">
            {USES.map(([use, label]) => (
              <TickBox
                key={use}
                label={label}
                disabled={!mayEdit}
                checked={details.uses.includes(use)}
                onChange={({ target }) =>
                  save({ uses: target.checked ? [...details.uses, use] : details.uses.filter((one) => one !== use) })
                }
              />
            ))}
          </div>
        </fieldset>
        <div className="grid grid-cols-2 gap-3 max-sm:grid-cols-1">
          {words('madeBy', 'Made by', 200)}
          {words('checkedBy', 'Proofread by', 200)}
        </div>
        {words('care', 'Care', 1_000, { lines: 2 })}
        {words('permission', 'What may be done with piece and pattern', 1_000, { lines: 2 })}
        {words('contact', 'Questions go to', 300)}
      </div>
    </section>
  );
}
