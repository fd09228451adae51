import { useId, useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Switch } from '../../ui/switch.tsx';
import { useDesk } from '../use-desk.ts';

const OPTIONS = [
  { value: 'US', label: 'US terms' },
  { value: 'UK', label: 'UK terms' },
] as const;

/** Which terms the text speaks, and why; what the first line works into where it does not begin by itself. */
export function TermsField() {
  const { written, counting } = useDesk();
  const { result } = counting;
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? (written.base === null ? '' : String(written.base));
  const isBad = shown !== '' && !/^[1-9]\d{0,4}$/.test(shown);
  const hasText = written.text.trim() !== '';
  return (
    <div className="flex flex-none flex-wrap items-start gap-x-6 gap-y-2.5 border-t border-rule px-4 py-2.5">
      <div className="min-w-[min(100%,180px)] flex-1">
        <Switch
          label="Terms"
          value={written.terms ?? result?.counted.terms ?? 'US'}
          options={OPTIONS}
          onChange={written.setTerms}
        />
        <p className="small mt-1 min-h-[18px] text-walnut2" role="status">
          {written.terms ? (
            <>
              As you chose.{' '}
              <Button kind="quiet" size="row" className="-my-1 h-[22px]!" onClick={() => written.setTerms(null)}>
                Tell by the text
              </Button>
            </>
          ) : (
            hasText && result?.counted.termsReason
          )}
        </p>
      </div>
      <div>
        <label htmlFor={id} className="label mb-0! flex items-center gap-2 font-normal! text-[15px]!">
          First line works into
          <input
            id={id}
            inputMode="numeric"
            size={4}
            value={shown}
            placeholder="–"
            aria-invalid={isBad}
            aria-describedby={`${id}-why`}
            className="field field-row tn w-[64px]! text-right max-sm:h-11!"
            onChange={({ target }) => {
              const next = target.value.trim();
              setTyped(next);
              if (next === '') written.setBase(null);
              else if (/^[1-9]\d{0,4}$/.test(next)) written.setBase(Number(next));
            }}
            onBlur={() => setTyped(null)}
          />
        </label>
        <p id={`${id}-why`} className={isBad ? 'small mt-1 text-madder' : 'small mt-1 text-walnut2'}>
          {isBad ? 'A whole number of stitches, like 24.' : 'Only if it begins in no ring or chain.'}
        </p>
      </div>
    </div>
  );
}
