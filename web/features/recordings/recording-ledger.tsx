import { ArrowDown, ArrowUp, Plus } from 'lucide-react';
import { useState } from 'react';
import type { Recording } from '#contract/recordings';
import { cx } from '../../lib/class-names.ts';
import { Button, IconButton } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useToast } from '../../ui/toast.tsx';
import { ElsewhereForm } from './elsewhere-form.tsx';
import { useRecordingDeeds } from './recordings.queries.ts';

/** What there is of a recording, in a few words. */
function have({ clip, upload, transcript, publicUrl }: Recording): string {
  const parts = [
    ...(clip ? ['clip'] : upload && upload.state !== 'refused' ? ['clip on its way'] : []),
    ...(transcript ? ['transcript'] : []),
    ...(publicUrl ? ['address elsewhere'] : []),
  ];
  return parts.length === 0 ? 'nothing yet' : parts.join(', ');
}

interface RecordingListProps {
  patternId: string;
  recordings: readonly Recording[];
  chosen: Recording | undefined;
  mayEdit: boolean;
  onChoose: (id: string) => void;
  onAdd: () => void;
}

/** The recordings of a pattern in their order, and what the chosen one is called. */
export function RecordingLedger({ patternId, recordings, chosen, mayEdit, onChoose, onAdd }: RecordingListProps) {
  const deeds = useRecordingDeeds(patternId);
  const toast = useToast();
  const place = recordings.findIndex(({ id }) => id === chosen?.id);
  const moveTo = (after: string | null) => chosen && deeds.edit.mutate({ of: chosen, edit: { after } });
  const remove = () => {
    if (!chosen) return;
    deeds.remove.mutate(chosen, {
      onSuccess: () =>
        toast(`${chosen.title} is taken out`, () => deeds.putBack.mutate({ ...chosen, version: chosen.version + 1 })),
    });
  };
  const failed = deeds.edit.isError || deeds.remove.isError;
  return (
    <div>
      <ul aria-label="Recordings of this pattern" className="bg-sheet">
        {recordings.map((recording) => (
          <li key={recording.id}>
            <button
              type="button"
              aria-pressed={recording.id === chosen?.id}
              onClick={() => onChoose(recording.id)}
              className={cx(
                'grid w-full grid-cols-[28px_minmax(0,1fr)] border-b border-feint px-6 py-2 text-left max-sm:px-4',
                recording.id === chosen?.id ? 'bar bg-woadwash' : 'hover:bg-hover',
              )}
            >
              <span className="text-walnut3">{recording.number}</span>
              <span className="min-w-0">
                <b className="block truncate">{recording.title}</b>
                <span className="small text-walnut2">{have(recording)}</span>
              </span>
            </button>
          </li>
        ))}
      </ul>
      {mayEdit && (
        <p className="border-b border-rule bg-sheet px-4 py-1.5">
          <Button kind="quiet" icon={Plus} onClick={onAdd}>
            Add {recordings.length === 0 ? 'a' : 'another'} recording
          </Button>
        </p>
      )}
      {chosen && (
        <div key={`${chosen.id} ${chosen.version}`} className="flex flex-col gap-4 px-6 py-4 max-sm:px-4">
          <NameField
            recording={chosen}
            isReadOnly={!mayEdit}
            onSave={(title) => deeds.edit.mutate({ of: chosen, edit: { title } })}
          />
          <ElsewhereForm
            url={chosen.publicUrl}
            offsetMs={chosen.publicOffsetMs}
            isReadOnly={!mayEdit}
            onSave={(edit) => deeds.edit.mutate({ of: chosen, edit })}
          />
          {failed && (
            <ErrorNote what="Not saved.">Somebody else was quicker. What is stored is shown; try again.</ErrorNote>
          )}
          {mayEdit && (
            <div className="flex flex-wrap items-center gap-2">
              {place > 0 && (
                <IconButton icon={ArrowUp} label="Earlier" onClick={() => moveTo(recordings[place - 2]?.id ?? null)} />
              )}
              {place >= 0 && place < recordings.length - 1 && (
                <IconButton icon={ArrowDown} label="Later" onClick={() => moveTo(recordings[place + 1]!.id)} />
              )}
              <Button kind="harm" className="ml-auto" onClick={remove}>
                Take out of the pattern
              </Button>
            </div>
          )}
          <p className="small text-walnut2">
            Its number {chosen.number} is printed in addresses and never given to another recording.
          </p>
        </div>
      )}
    </div>
  );
}

function NameField(props: { recording: Recording; isReadOnly: boolean; onSave: (title: string) => void }) {
  const [title, setTitle] = useState(props.recording.title);
  const save = () => {
    const typed = title.trim();
    if (typed !== '' && typed !== props.recording.title) props.onSave(typed);
  };
  return (
    <Field
      label="Name of the recording"
      value={title}
      maxLength={200}
      readOnly={props.isReadOnly}
      onChange={({ target }) => setTitle(target.value)}
      onBlur={save}
    />
  );
}
