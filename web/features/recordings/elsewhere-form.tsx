import { useState } from 'react';
import { PublicUrl } from '#contract/recordings';
import { formatMoment, parseMoment } from '../../lib/time.ts';
import { Field } from '../../ui/field.tsx';

interface ElsewhereFormProps {
  url: string | null;
  offsetMs: number;
  isReadOnly?: boolean;
  onSave: (elsewhere: { publicUrl: string | null; publicOffsetMs: number }) => void;
}

/** Where a recording stands elsewhere, and at what time there our own begins. The address is kept, and never fetched. */
export function ElsewhereForm({ url, offsetMs, isReadOnly = false, onSave }: ElsewhereFormProps) {
  const [address, setAddress] = useState(url ?? '');
  const [starts, setStarts] = useState(formatMoment(offsetMs));
  const [errors, setErrors] = useState<{ address?: string; starts?: string }>({});
  const save = () => {
    const typed = address.trim();
    const isFine = typed === '' || PublicUrl.safeParse(typed).success;
    const ms = parseMoment(starts.trim() === '' ? '0:00' : starts);
    setErrors({
      ...(!isFine && { address: 'An address begins with https:// or http://.' }),
      ...(ms === null && { starts: 'A time, like 1:04.' }),
    });
    if (!isFine || ms === null) return;
    const publicUrl = typed === '' ? null : typed;
    if (publicUrl !== url || ms !== offsetMs) onSave({ publicUrl, publicOffsetMs: ms });
  };
  return (
    <fieldset className="grid grid-cols-[minmax(0,1fr)_76px] gap-x-3" disabled={isReadOnly}>
      <legend className="label">Recording stands elsewhere?</legend>
      <Field
        label="Public address"
        hideLabel
        type="url"
        inputMode="url"
        placeholder="https://"
        value={address}
        error={errors.address}
        hint="Public address"
        onChange={({ target }) => setAddress(target.value)}
        onBlur={save}
      />
      <Field
        label="Starts at"
        hideLabel
        value={starts}
        error={errors.starts}
        hint="starts at"
        className="text-right"
        onChange={({ target }) => setStarts(target.value)}
        onBlur={save}
      />
    </fieldset>
  );
}
