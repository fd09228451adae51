import type { Recording } from '#contract/recordings';
import { Field } from '../../ui/field.tsx';
import { Switch } from '../../ui/switch.tsx';
import { ElsewhereForm } from './elsewhere-form.tsx';
import { pieceWords } from './draft-words.ts';

const TERMS = [
  { value: 'US', label: 'US terms' },
  { value: 'UK', label: 'UK terms' },
] as const;

const HINTS = {
  US: 'Your sc is a UK dc. Viewers can switch.',
  UK: 'Your dc is a US sc. Viewers can switch.',
} as const;

interface NewPatternFormProps {
  title: string;
  terms: 'US' | 'UK';
  titleError: string | undefined;
  recording: Recording | undefined;
  onType: (title: string) => void;
  onSave: (edit: { title?: string; terms?: 'US' | 'UK' }) => void;
  onElsewhere: (elsewhere: { publicUrl: string | null; publicOffsetMs: number }) => void;
}

/** What only the maker knows. */
export function NewPatternForm(props: NewPatternFormProps) {
  const { title, terms, titleError, recording, onType, onSave, onElsewhere } = props;
  const summary = recording?.transcript?.reading.summary;
  const pieces = summary?.pieces ?? [];
  return (
    <form
      className="flex flex-col gap-4 border-r border-rule px-6 py-4 max-sm:px-4"
      onSubmit={(event) => event.preventDefault()}
    >
      <Field
        label="Name"
        name="title"
        maxLength={200}
        value={title}
        error={titleError}
        autoFocus
        onChange={({ target }) => onType(target.value)}
        onBlur={() => title.trim() !== '' && onSave({ title: title.trim() })}
      />
      <div>
        <span className="label" aria-hidden>
          You say your stitches in
        </span>
        <Switch
          label="You say your stitches in"
          value={terms}
          options={TERMS}
          onChange={(value) => onSave({ terms: value })}
        />
        <p className="small mt-1 text-walnut2">{HINTS[terms]}</p>
        {summary && (
          <p className="small mt-1">
            Heard as {summary.terms} terms: {summary.termsReason}
          </p>
        )}
      </div>
      <div>
        <h2 className="label">Pieces</h2>
        {pieces.length === 0 ? (
          <p className="small text-walnut2">They are heard in the transcript, or named at the bench.</p>
        ) : (
          <>
            <ul className="border border-edge bg-field">
              {pieces.map((piece, index) => (
                <li key={index} className="border-b border-feint px-2.5 py-1 last:border-b-0">
                  <span className="wr">{pieceWords(piece)}</span>
                </li>
              ))}
            </ul>
            <p className="small mt-1 text-walnut2">Heard in the transcript. Change what is wrong at the bench.</p>
          </>
        )}
      </div>
      <hr className="border-feint" />
      <ElsewhereForm
        key={recording?.id ?? 'none'}
        url={recording?.publicUrl ?? null}
        offsetMs={recording?.publicOffsetMs ?? 0}
        onSave={onElsewhere}
      />
      <p className="small -mt-2 text-walnut2">
        Sheet, codes and chapters can point there. It is linked to, and never fetched.
      </p>
    </form>
  );
}
