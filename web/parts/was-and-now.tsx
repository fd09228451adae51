import { changedWords } from './changed-words.ts';

/** Wording as it was: what is not in the new one is ruled through once. */
export function WasWords({ was, now }: { was: string; now: string }) {
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

/** Wording as it is or would be: what is not in the old one is bold over a woad line. */
export function NowWords({ was, now }: { was: string; now: string }) {
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
