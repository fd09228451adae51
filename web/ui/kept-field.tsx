import { useState } from 'react';
import { Field, TextField } from './field.tsx';

interface Kept {
  label: string;
  value: string;
  onSave: (text: string) => void;
  hint?: string;
  hideLabel?: boolean;
  lines?: number;
  maxLength: number;
  disabled?: boolean;
  placeholder?: string;
  inputMode?: 'decimal';
}

/**
 * A field that saves as one types. What stands in it while it has the focus is what was typed, so that a save coming
 * back tidied (without the space just typed) does not pull the words from under the fingers.
 */
export function KeptField({ label, value, onSave, lines = 1, ...rest }: Kept) {
  const [typed, setTyped] = useState<string | null>(null);
  const shared = {
    label,
    ...rest,
    value: typed ?? value,
    onChange: (event: { target: { value: string } }) => {
      setTyped(event.target.value);
      onSave(event.target.value);
    },
    onBlur: () => setTyped(null),
  };
  return lines > 1 ? <TextField {...shared} rows={lines} /> : <Field {...shared} />;
}
