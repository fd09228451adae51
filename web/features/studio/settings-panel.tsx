import { useEffect } from 'react';
import { type Studio, StudioEdit } from '#contract/studios';
import { useContractForm } from '../../lib/use-contract-form.ts';
import { Button } from '../../ui/button.tsx';
import { Field, TextField } from '../../ui/field.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { Switch } from '../../ui/switch.tsx';
import { useToast } from '../../ui/toast.tsx';
import { useEditStudio } from './studio.queries.ts';

const looks = ({ name, paper, defaultTerms, head, foot }: Studio) => ({ name, paper, defaultTerms, head, foot });

const inGigabytes = (bytes: number) => (bytes / 1e9).toLocaleString('en-GB', { maximumFractionDigits: 1 });

/** How much of what it may store a studio has stored. */
function Room({ studio }: { studio: Studio }) {
  const share = studio.usedBytes / studio.quotaBytes;
  return (
    <div className="border-t border-rule px-4 py-3.5">
      <h2 className="h-panel">Room for recordings</h2>
      <div className="mt-2 flex gap-[3px]" aria-hidden>
        {Array.from({ length: 24 }, (_, i) => (
          <span key={i} className={i < share * 24 ? 'h-[6px] flex-1 bg-woad' : 'h-[6px] flex-1 border border-edge'} />
        ))}
      </div>
      <p className="mt-1.5 text-walnut2">
        {inGigabytes(studio.usedBytes)} of {inGigabytes(studio.quotaBytes)} GB in use
      </p>
    </div>
  );
}

/** What all sheets of a studio share. Owners change it; others see it. */
export function SettingsPanel({ studio }: { studio: Studio }) {
  const toast = useToast();
  const isOwner = studio.role === 'owner';
  const form = useContractForm({
    schema: StudioEdit,
    defaultValues: looks(studio),
    submit: useEditStudio(studio),
    onDone: () => toast('Saved. The next sheet has it.'),
  });
  const { reset } = form;
  useEffect(() => reset(looks(studio), { keepDirtyValues: true }), [studio, reset]);
  const [paper, terms] = [form.watch('paper') ?? studio.paper, form.watch('defaultTerms') ?? studio.defaultTerms];
  return (
    <section aria-labelledby="looks" className="border-l border-rule max-lg:border-t max-lg:border-l-0">
      <div className="panel-head">
        <h2 id="looks" className="h-panel">
          The look of all sheets
        </h2>
      </div>
      <form onSubmit={(event) => void form.onSubmit(event)} noValidate className="px-4 py-3.5">
        <fieldset disabled={!isOwner} className="space-y-3.5">
          {form.failure && <ErrorNote what="Not saved.">{form.failure}</ErrorNote>}
          <Field label="Name on the sheet" error={form.errorAt('name')} {...form.register('name')} />
          <div className="flex flex-wrap gap-x-8 gap-y-3">
            <div>
              <span className="label">Paper</span>
              <Switch
                label="Paper"
                value={paper}
                options={[
                  { value: 'A4', label: 'A4' },
                  { value: 'Letter', label: 'Letter' },
                ]}
                onChange={(value) => form.setValue('paper', value, { shouldDirty: true })}
              />
            </div>
            <div>
              <span className="label">Terms of new patterns</span>
              <Switch
                label="Terms of new patterns"
                value={terms}
                options={[
                  { value: 'US', label: 'US' },
                  { value: 'UK', label: 'UK' },
                ]}
                onChange={(value) => form.setValue('defaultTerms', value, { shouldDirty: true })}
              />
            </div>
          </div>
          <TextField
            label="At the foot of every sheet"
            hint="What may be done with the piece and the pattern, and whom to ask."
            rows={4}
            error={form.errorAt('foot')}
            {...form.register('foot')}
          />
          {isOwner ? (
            <Button type="submit" kind="primary" notYet={form.formState.isDirty ? undefined : 'Nothing is changed yet'}>
              {form.isSending ? 'Saving' : 'Save the look'}
            </Button>
          ) : (
            <p className="text-walnut2">The owner of the studio sets this.</p>
          )}
        </fieldset>
      </form>
      <Room studio={studio} />
    </section>
  );
}
