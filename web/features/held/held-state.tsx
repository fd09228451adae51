import { EyeOff, MicOff, PenLine } from 'lucide-react';
import { type HeldLine, type HeldState } from '#contract/held';
import { VerdictMark } from '../../parts/verdict-mark.tsx';
import { Icon } from '../../ui/icon.tsx';

/** In the order in which they want a look. */
export const STATES: readonly HeldState[] = ['differently', 'never-said', 'not-written', 'as-written', 'not-filmed'];

export const STATE_WORDS: Readonly<Record<HeldState, string>> = {
  'as-written': 'as written',
  differently: 'said differently',
  'never-said': 'never said',
  'not-written': 'filmed, not written',
  'not-filmed': 'not filmed',
};

const COLOURS: Readonly<Record<HeldState, string>> = {
  'as-written': 'text-moss',
  differently: 'font-bold text-madder',
  'never-said': 'font-bold text-walnut',
  'not-written': 'font-bold text-weld',
  'not-filmed': 'text-walnut3',
};

/** How a line fared, by shape and word. */
export function StateLabel({ state }: { state: HeldState }) {
  return (
    <span className={`inline-flex items-center gap-2 whitespace-nowrap ${COLOURS[state]}`}>
      {state === 'as-written' && <VerdictMark verdict="agrees" />}
      {state === 'differently' && <VerdictMark verdict="differs" />}
      {state === 'never-said' && <Icon of={MicOff} size={16} />}
      {state === 'not-written' && <Icon of={PenLine} size={16} />}
      {state === 'not-filmed' && <Icon of={EyeOff} size={16} />}
      {STATE_WORDS[state]}
    </span>
  );
}

const UNLIKE_WORDS: Readonly<Record<HeldLine['unlike'][number], string>> = {
  instruction: 'instruction',
  total: 'total',
  number: 'number',
};

/** "another instruction and total". */
export const unlikeWords = (unlike: HeldLine['unlike']): string =>
  `another ${unlike.map((one) => UNLIKE_WORDS[one]).join(' and ')}`;
