import { Upload } from 'lucide-react';
import { useRef } from 'react';
import { Button, type ButtonKind } from '../../ui/button.tsx';

interface FileChoiceProps {
  children: string;
  accept: string;
  kind?: ButtonKind;
  onFile: (file: File) => void;
}

/** A button that lets one file be chosen. The same file may be chosen twice in a row. */
export function FileChoice({ children, accept, kind = 'plain', onFile }: FileChoiceProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <input
        ref={input}
        type="file"
        accept={accept}
        hidden
        onChange={({ target }) => {
          const file = target.files?.[0];
          if (file) onFile(file);
          target.value = '';
        }}
      />
      <Button kind={kind} icon={Upload} onClick={() => input.current?.click()}>
        {children}
      </Button>
    </>
  );
}

export const CLIP_ACCEPT = '.mp4,.m4v,.webm,.mov,video/mp4,video/webm,video/quicktime';
export const TRANSCRIPT_ACCEPT = '.srt,.vtt,.txt,.md';
