import { FolderOpen } from 'lucide-react';
import { type ChangeEvent, type DragEvent, useRef, useState } from 'react';
import { cx } from '../../lib/class-names.ts';
import { readTextFile, TEXT_FILE_PROBLEMS } from '../../lib/text-file.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useDesk } from '../use-desk.ts';
import { EXAMPLE } from './example.ts';
import { TermsField } from './terms-field.tsx';
import { TextField } from './text-field.tsx';

/** Puts the words of a file in the place of the text; what stood there comes back by undo. */
function useFile() {
  const { replaceAll } = useDesk();
  const [problem, setProblem] = useState<string | null>(null);
  const open = (file: File | undefined) => {
    if (!file) return;
    void readTextFile(file).then((read) => {
      setProblem('problem' in read ? TEXT_FILE_PROBLEMS[read.problem] : null);
      if (!('problem' in read)) replaceAll(read.text, `${file.name} opened`);
    });
  };
  return { problem, open };
}

/** The text, and what it is counted in. A file may be dropped anywhere on it. */
export function TextPanel() {
  const { written, replaceAll } = useDesk();
  const file = useFile();
  const chooser = useRef<HTMLInputElement>(null);
  const [isOver, setOver] = useState(false);
  const isEmpty = written.text.trim() === '';
  const drop = (event: DragEvent) => {
    const [dropped] = event.dataTransfer.files;
    if (!dropped) return;
    event.preventDefault();
    setOver(false);
    file.open(dropped);
  };
  return (
    <section
      aria-labelledby="text-heading"
      className={cx(
        'count-text flex min-h-0 min-w-0 flex-col border-rule bg-chalk lg:border-r print:hidden',
        isOver && 'outline-2 -outline-offset-4 outline-woad outline-dashed',
      )}
      onDragOver={(event) => {
        if (!event.dataTransfer.types.includes('Files')) return;
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      <div className="panel-head gap-x-3 px-4!">
        <h2 id="text-heading" className="h-panel mr-auto">
          As written
        </h2>
        {isEmpty ? (
          <Button kind="quiet" size="row" onClick={() => replaceAll(EXAMPLE, 'An example put in')}>
            Try an example
          </Button>
        ) : (
          <Button kind="quiet" size="row" onClick={() => replaceAll('', 'Cleared')}>
            Clear
          </Button>
        )}
        <Button kind="quiet" size="row" icon={FolderOpen} onClick={() => chooser.current?.click()}>
          Open a file
        </Button>
        <input
          ref={chooser}
          type="file"
          accept=".txt,.md,text/plain"
          className="hidden"
          aria-label="Text file"
          onChange={(event: ChangeEvent<HTMLInputElement>) => {
            file.open(event.target.files?.[0]);
            event.target.value = '';
          }}
        />
      </div>
      {file.problem && (
        <div className="px-4 py-2">
          <ErrorNote what="Not opened.">{file.problem}</ErrorNote>
        </div>
      )}
      {written.isBroken && (
        <div className="px-4 py-2">
          <ErrorNote what="This link came in pieces.">
            Part of it was lost on its way. Ask for it again, or have the text itself sent.
          </ErrorNote>
        </div>
      )}
      <div className="count-scroll min-h-0 grow overflow-y-auto">
        <TextField describedBy="count-promise" />
      </div>
      <TermsField />
    </section>
  );
}
