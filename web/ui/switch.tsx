import { type ReactNode, useId } from 'react';

/** Joined words, one of them chosen: US terms / UK. A radio group underneath, so arrows move it. */
export function Switch<T extends string>(props: {
  label: string;
  value: T;
  options: readonly { value: T; label: ReactNode }[];
  onChange: (value: T) => void;
}) {
  const name = useId();
  return (
    <span role="radiogroup" aria-label={props.label} className="switch">
      {props.options.map(({ value, label }) => (
        <label key={value}>
          <input
            type="radio"
            className="sr-only"
            name={name}
            checked={value === props.value}
            onChange={() => props.onChange(value)}
          />
          {label}
        </label>
      ))}
    </span>
  );
}
