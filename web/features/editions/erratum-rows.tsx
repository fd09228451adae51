import type { Erratum } from '#contract/editions';
import { changedWords } from './changed-words.ts';

const KINDS: Readonly<Record<Erratum['weight'], string>> = {
  correction: 'Correction',
  clearer: 'Made clearer',
  added: 'Added',
  look: 'Not a correction',
};

/** What it said, ruled through once where it changed. */
export function Was({ erratum: { was, now } }: { erratum: Erratum }) {
  if (was === '') return <span className="text-walnut2">–</span>;
  return changedWords(was, now).map(({ text, isChanged }, i) =>
    isChanged ? (
      <s key={i} className="text-walnut2">
        {text}
      </s>
    ) : (
      <span key={i}>{text}</span>
    ),
  );
}

/** What it says, the difference bold over a woad line. */
export function Now({ erratum: { was, now } }: { erratum: Erratum }) {
  if (now === '') return <span className="text-walnut2">left out</span>;
  return changedWords(now, was).map(({ text, isChanged }, i) =>
    isChanged ? (
      <b key={i} className="border-b-[1.5px] border-woad">
        {text}
      </b>
    ) : (
      <span key={i}>{text}</span>
    ),
  );
}

export const kindWords = (weight: Erratum['weight']): string => KINDS[weight];
