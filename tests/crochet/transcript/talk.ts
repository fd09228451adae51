import { type Cue } from '#crochet';

/** Cues of about eight words, as fast as people speak; `|` is a silence of twenty seconds. */
export function talk(text: string): readonly Cue[] {
  let at = 2000;
  return text.split('|').flatMap((part, n) => {
    if (n > 0) at += 20_000;
    const words = part.trim().split(/\s+/);
    const cues: Cue[] = [];
    for (let i = 0; i < words.length; i += 8) {
      const said = words.slice(i, i + 8).join(' ');
      const lasts = said.length * 70;
      cues.push({ startMs: at, endMs: at + lasts, text: said });
      at += lasts;
    }
    return cues;
  });
}
