import { createContext, type ReactNode, useCallback, useContext, useEffect, useMemo, useState } from 'react';

interface Toast {
  id: number;
  text: ReactNode;
  undo?: () => void;
}
type Show = (text: ReactNode, undo?: () => void) => void;

const ToastContext = createContext<Show>(() => undefined);
const SHOWN_MS = 6000;

/** Says what was just done, with its Undo. One at a time; errors are never toasts. */
export const useToast = (): Show => useContext(ToastContext);

export function ToastProvider({ children }: { children: ReactNode }) {
  const [toast, setToast] = useState<Toast | null>(null);
  const [isHeld, setHeld] = useState(false);
  const show = useCallback<Show>((text, undo) => {
    setHeld(false);
    setToast((before) => ({ id: (before?.id ?? 0) + 1, text, ...(undo ? { undo } : {}) }));
  }, []);
  useEffect(() => {
    if (!toast || isHeld) return;
    const timer = setTimeout(() => setToast(null), SHOWN_MS);
    return () => clearTimeout(timer);
  }, [toast, isHeld]);
  const hold = useMemo(
    () => ({
      onFocus: () => setHeld(true),
      onBlur: () => setHeld(false),
      onMouseEnter: () => setHeld(true),
      onMouseLeave: () => setHeld(false),
    }),
    [],
  );
  return (
    <ToastContext value={show}>
      {children}
      <div className="pointer-events-none fixed bottom-28 left-20 z-40 max-sm:inset-x-3 max-sm:bottom-28" role="status">
        {toast && (
          <p
            key={toast.id}
            className="pointer-events-auto inline-block rounded-2 bg-cloth px-4 py-2.5 text-white"
            {...hold}
          >
            {toast.text}
            {toast.undo && (
              <button
                type="button"
                className="ml-3 border-b border-clothlink font-medium text-clothlink focus-visible:outline-clothlink"
                onClick={() => {
                  toast.undo?.();
                  setToast(null);
                }}
              >
                Undo
              </button>
            )}
          </p>
        )}
      </div>
    </ToastContext>
  );
}
