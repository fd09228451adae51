import type { Erratum } from '#contract/editions';
import { NowWords, WasWords } from '../../parts/was-and-now.tsx';

const KINDS: Readonly<Record<Erratum['weight'], string>> = {
  correction: 'Correction',
  clearer: 'Made clearer',
  added: 'Added',
  look: 'Not a correction',
};

/** What it said, ruled through once where it changed. */
export function Was({ erratum: { was, now } }: { erratum: Erratum }) {
  return was === '' ? <span className="text-walnut2">–</span> : <WasWords was={was} now={now} />;
}

/** What it says, the difference bold over a woad line. */
export function Now({ erratum: { was, now } }: { erratum: Erratum }) {
  return now === '' ? <span className="text-walnut2">left out</span> : <NowWords was={was} now={now} />;
}

export const kindWords = (weight: Erratum['weight']): string => KINDS[weight];
