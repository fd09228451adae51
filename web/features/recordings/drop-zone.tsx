import { type DragEvent, type ReactNode, useState } from 'react';
import { cx } from '../../lib/class-names.ts';

const TRANSCRIPT = /\.(?:srt|vtt|txt|md)$/i;

interface DropZoneProps {
  /** A file by which a transcript is known, and any other. */
  onTranscript: (file: File) => void;
  onClip: (file: File) => void;
  isOpen: boolean;
  className?: string;
  children: ReactNode;
}

/** Files may be dropped anywhere on it; the buttons inside do the same for those who do not drag. */
export function DropZone({ onTranscript, onClip, isOpen, className, children }: DropZoneProps) {
  const [isOver, setOver] = useState(false);
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    for (const file of event.dataTransfer.files) (TRANSCRIPT.test(file.name) ? onTranscript : onClip)(file);
  };
  if (!isOpen) return <div className={className}>{children}</div>;
  return (
    <div
      className={cx(className, isOver && 'outline-2 -outline-offset-4 outline-woad outline-dashed')}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      {children}
    </div>
  );
}
