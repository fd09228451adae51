import {
  type InputHTMLAttributes,
  type ReactNode,
  type SelectHTMLAttributes,
  type TextareaHTMLAttributes,
  useId,
} from 'react';
import { cx } from '../lib/class-names.ts';

interface Labelled {
  label: string;
  hint?: ReactNode;
  /** What is wrong and what to do. */
  error?: string | undefined;
  /** At the right of the label: a link such as "Forgotten?". */
  aside?: ReactNode;
  /** For rows of a table whose column heading already says it: the label is read out but not shown. */
  hideLabel?: boolean;
}

/** Label above, hint or error below, all tied to the control. */
function Frame({ id, label, hint, error, aside, hideLabel, children }: Labelled & { id: string; children: ReactNode }) {
  return (
    <div>
      <div className={cx('flex items-baseline justify-between', hideLabel && 'sr-only')}>
        <label htmlFor={id} className="label">
          {label}
        </label>
        {aside}
      </div>
      {children}
      {hint && !error && (
        <p id={`${id}-hint`} className="small mt-1 text-walnut2">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="small mt-1.5 flex gap-2 text-madder" role="alert">
          <ErrorDiamond />
          <span>{error}</span>
        </p>
      )}
    </div>
  );
}

const ErrorDiamond = () => (
  <svg width="12" height="12" viewBox="0 0 16 16" className="mt-0.5" aria-hidden>
    <path d="M8 .8 15.2 8 8 15.2.8 8Z" fill="currentColor" />
    <path d="M8 4.4v4.4M8 10.4v1.4" stroke="#fff" strokeWidth="1.6" />
  </svg>
);

const tie = (id: string, hint: ReactNode, error?: string) => ({
  id,
  ...(error
    ? { 'aria-invalid': true, 'aria-describedby': `${id}-error` }
    : hint
      ? { 'aria-describedby': `${id}-hint` }
      : {}),
});

interface Tall {
  tall?: boolean;
}

/** One line of text. Works with react-hook-form: `<Field label="Name" {...register('name')} error={…} />`. */
export function Field({
  label,
  hint,
  error,
  aside,
  hideLabel = false,
  tall,
  className,
  id: given,
  ...rest
}: Labelled & Tall & InputHTMLAttributes<HTMLInputElement>) {
  const made = useId();
  const id = given ?? made;
  return (
    <Frame {...{ id, label, hint, error, aside, hideLabel }}>
      <input {...rest} {...tie(id, hint, error)} className={cx('field', tall && 'field-tall', className)} />
    </Frame>
  );
}

/** Several lines of text. */
export function TextField({
  label,
  hint,
  error,
  aside,
  hideLabel = false,
  className,
  id: given,
  ...rest
}: Labelled & TextareaHTMLAttributes<HTMLTextAreaElement>) {
  const made = useId();
  const id = given ?? made;
  return (
    <Frame {...{ id, label, hint, error, aside, hideLabel }}>
      <textarea rows={3} {...rest} {...tie(id, hint, error)} className={cx('field', className)} />
    </Frame>
  );
}

/** One of a list; where there are two or three, use a `Switch`. */
export function SelectField({
  label,
  hint,
  error,
  aside,
  hideLabel = false,
  className,
  id: given,
  ...rest
}: Labelled & SelectHTMLAttributes<HTMLSelectElement>) {
  const made = useId();
  const id = given ?? made;
  return (
    <Frame {...{ id, label, hint, error, aside, hideLabel }}>
      <select {...rest} {...tie(id, hint, error)} className={cx('field', className)} />
    </Frame>
  );
}

/** A box to tick, with its words. */
export function TickBox({ label, className, ...rest }: { label: ReactNode } & InputHTMLAttributes<HTMLInputElement>) {
  return (
    <label className={cx('flex cursor-pointer items-start gap-2.5 max-sm:min-h-11 max-sm:items-center', className)}>
      <input type="checkbox" {...rest} className="tick mt-0.5" />
      <span>{label}</span>
    </label>
  );
}
