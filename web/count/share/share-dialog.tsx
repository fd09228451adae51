import { Copy } from 'lucide-react';
import { useEffect, useRef, useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Dialog } from '../../ui/dialog.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { useDesk } from '../use-desk.ts';
import { LONG_LINK, MOST_LINK, toFragment } from './share-link.ts';

const figures = (n: number) => n.toLocaleString('en');

/** The link for what is written now; null while it is being made. */
function useLink(): string | null {
  const { written } = useDesk();
  const { text, terms, base } = written;
  const [link, setLink] = useState<string | null>(null);
  useEffect(() => {
    let isCurrent = true;
    void toFragment({ text, terms, base }).then((fragment) => {
      if (isCurrent) setLink(`${location.origin}${location.pathname}${fragment}`);
    });
    return () => {
      isCurrent = false;
    };
  }, [text, terms, base]);
  return link;
}

/** Copies where the browser lets it; a page without https has no clipboard. */
async function copyWords(words: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(words);
    return true;
  } catch {
    return false;
  }
}

function Link() {
  const { written } = useDesk();
  const { text } = written;
  const link = useLink();
  const [copied, setCopied] = useState<'link' | 'text' | 'by-hand' | null>(null);
  const field = useRef<HTMLTextAreaElement>(null);
  if (link === null) return null;
  const copy = (what: 'link' | 'text') =>
    void copyWords(what === 'link' ? link : text).then((isDone) => {
      if (!isDone) field.current?.select();
      setCopied(isDone ? what : 'by-hand');
    });
  const isTooLong = link.length > MOST_LINK;
  return (
    <div className="flex flex-col gap-3 p-4">
      <p>
        The text is in the link itself, behind the #. Browsers do not send that part: only who has the link can read it.
      </p>
      {isTooLong ? (
        <ErrorNote what={`The link would be ${figures(link.length)} characters long.`}>
          Links of more than {figures(MOST_LINK)} do not arrive whole. Send the text itself, or share one piece at a
          time.
        </ErrorNote>
      ) : (
        <>
          <textarea
            ref={field}
            readOnly
            aria-label="The link"
            rows={3}
            value={link}
            className="field small break-all"
            onFocus={(event) => event.target.select()}
          />
          {link.length > LONG_LINK && (
            <p className="border-l-4 border-double border-weld pl-2.5">
              {figures(link.length)} characters: some programs for mail and messages cut a link this long. Try it first.
            </p>
          )}
        </>
      )}
      <div className="flex flex-wrap items-center gap-3">
        {!isTooLong && (
          <Button kind="primary" icon={Copy} onClick={() => copy('link')}>
            Copy the link
          </Button>
        )}
        <Button onClick={() => copy('text')}>Copy the text</Button>
        <p role="status" className="text-walnut2">
          {copied === 'link' && 'The link is copied.'}
          {copied === 'text' && 'The text is copied.'}
          {copied === 'by-hand' && 'Copy it by hand: it is chosen.'}
        </p>
      </div>
    </div>
  );
}

/** A link that carries the text in itself. What stands behind its # no browser sends anywhere. */
export function ShareDialog({ isOpen, onClose }: { isOpen: boolean; onClose: () => void }) {
  return (
    <Dialog title="Share by a link" isOpen={isOpen} onClose={onClose}>
      {isOpen && <Link />}
    </Dialog>
  );
}
