import { X } from 'lucide-react';
import { type ReactNode, useEffect, useId, useRef } from 'react';
import { IconButton } from './button.tsx';

/** Something read over the page: the sheet of keys. Esc and a click beside it close it; the focus goes back by itself. */
export function Dialog({
  title,
  isOpen,
  onClose,
  children,
}: {
  title: string;
  isOpen: boolean;
  onClose: () => void;
  children: ReactNode;
}) {
  const ref = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const dialog = ref.current;
    if (!dialog) return;
    if (isOpen && !dialog.open) dialog.showModal();
    if (!isOpen && dialog.open) dialog.close();
  }, [isOpen]);
  return (
    <dialog
      ref={ref}
      aria-labelledby={titleId}
      onClose={onClose}
      onClick={(event) => event.target === ref.current && onClose()}
      className="m-auto max-h-[88dvh] w-[min(760px,94vw)] border border-edge bg-sheet text-walnut backdrop:bg-cloth/40"
    >
      <div className="panel-head justify-between bg-chalk">
        <h2 id={titleId} className="h-panel">
          {title}
        </h2>
        <IconButton icon={X} label="Close" onClick={onClose} />
      </div>
      {children}
    </dialog>
  );
}
