import { FolderOpen } from 'lucide-react';
import { type ChangeEvent, useRef, useState } from 'react';
import type { Terms } from '#crochet';
import { readTextFile, TEXT_FILE_PROBLEMS } from '../../lib/text-file.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { Switch } from '../../ui/switch.tsx';

const TERMS = [
  { value: 'US', label: 'US terms' },
  { value: 'UK', label: 'UK terms' },
] as const;

interface WrittenFormProps {
  title: string;
  text: string;
  terms: Terms;
  termsReason: string | null;
  onTitle: (title: string) => void;
  onText: (text: string) => void;
  onTerms: (terms: Terms) => void;
}

/** The text, by paste or from a file; its name and its terms, both found in it and both the maker's to change. */
export function WrittenForm({ title, text, terms, termsReason, onTitle, onText, onTerms }: WrittenFormProps) {
  const chooser = useRef<HTMLInputElement>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const open = (file: File | undefined) => {
    if (!file) return;
    void readTextFile(file).then((read) => {
      setProblem('problem' in read ? TEXT_FILE_PROBLEMS[read.problem] : null);
      if (!('problem' in read)) onText(read.text);
    });
  };
  return (
    <form
      className="flex min-h-0 flex-col gap-3.5 border-r border-rule px-6 py-4 max-sm:px-4"
      onSubmit={(event) => event.preventDefault()}
      onDragOver={(event) => event.preventDefault()}
      onDrop={(event) => {
        event.preventDefault();
        open(event.dataTransfer.files[0]);
      }}
    >
      <Field label="Name" name="title" maxLength={200} value={title} onChange={({ target }) => onTitle(target.value)} />
      <div>
        <Switch label="Written in" value={terms} options={TERMS} onChange={onTerms} />
        {termsReason !== null && <p className="small mt-1 text-walnut2">{termsReason}</p>}
      </div>
      <div className="flex min-h-[260px] grow flex-col">
        <div className="mb-1 flex items-end justify-between">
          <label htmlFor="written-text" className="label mb-0!">
            The pattern as written
          </label>
          <Button kind="quiet" size="row" icon={FolderOpen} onClick={() => chooser.current?.click()}>
            Open a file
          </Button>
        </div>
        <textarea
          id="written-text"
          autoFocus
          value={text}
          spellCheck={false}
          className="field grow resize-none!"
          placeholder={'Paste it here, as untidy as it is.'}
          onChange={({ target }) => onText(target.value)}
        />
        <input
          ref={chooser}
          type="file"
          accept=".txt,.md,text/plain"
          aria-label="Text file"
          className="hidden"
          onChange={(event: ChangeEvent<HTMLInputElement>) => {
            open(event.target.files?.[0]);
            event.target.value = '';
          }}
        />
        <p className="small mt-1 text-walnut2">Plain text (.txt, .md) up to 1 MB. It is read in your browser.</p>
      </div>
      {problem !== null && <ErrorNote what="Not opened.">{problem}</ErrorNote>}
    </form>
  );
}
