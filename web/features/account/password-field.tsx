import { Eye, EyeOff } from 'lucide-react';
import { type InputHTMLAttributes, type ReactNode, useState } from 'react';
import { IconButton } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';

const LEAST = 8;
const SHOWN = 24;

type Props = {
  label: string;
  error?: string | undefined;
  aside?: ReactNode;
  tall?: boolean;
} & InputHTMLAttributes<HTMLInputElement>;

/** A password with an eye to look at what is typed. */
export function PasswordField({ label, error, aside, tall = false, ...rest }: Props) {
  const [isShown, setShown] = useState(false);
  return (
    <div className="relative">
      <Field
        {...rest}
        label={label}
        error={error}
        aside={aside}
        tall={tall}
        type={isShown ? 'text' : 'password'}
        className="pr-10"
      />
      <span className={tall ? 'absolute top-[29px] right-1.5' : 'absolute top-[26px] right-1.5'}>
        <IconButton
          icon={isShown ? EyeOff : Eye}
          label={isShown ? 'Hide the password' : 'Show the password'}
          onClick={() => setShown(!isShown)}
        />
      </span>
    </div>
  );
}

/** How long a new password is, stitch by stitch; length is all that is asked of it. */
export function PasswordLength({ value }: { value: string }) {
  const letters = Array.from(value).length;
  return (
    <div className="mt-1.5">
      <div className="flex gap-[3px]" aria-hidden>
        {Array.from({ length: SHOWN }, (_, i) => (
          <span
            key={i}
            className={
              i < letters
                ? 'h-[5px] flex-1 bg-woad'
                : i < LEAST
                  ? 'h-[5px] flex-1 border border-edge'
                  : 'h-[5px] flex-1 border border-feint'
            }
          />
        ))}
      </div>
      <p className="small mt-1.5 text-walnut2">
        {letters > 0 && `${letters} ${letters === 1 ? 'letter' : 'letters'}. `}
        {LEAST} is the least, words do as well as signs. Not one of the common ones.
      </p>
    </div>
  );
}
