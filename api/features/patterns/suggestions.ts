import { broughtCautions, type Draft } from '#crochet';
import type { Fields } from './entities.ts';

type Suggestion = Draft['suggestions'][number];

const plain = (text: unknown) => (typeof text === 'string' ? text.trim().toLowerCase() : '');
const FILLING = /\b(?:stuffing|fib(?:re|er) ?fill|filling|poly ?fill?)\b/i;

const MATERIALS = { hook: 'hook', yarn: 'yarn', notion: 'notion' } as const;
const isMaterial = (kind: string): kind is keyof typeof MATERIALS => kind in MATERIALS;

/** Materials heard in a recording that the pattern does not list yet, each once. */
export function suggestedMaterials(suggestions: readonly Suggestion[], present: readonly Fields[]): Fields[] {
  const known = new Set(present.map(({ name }) => plain(name)));
  return suggestions.flatMap(({ kind, text, atMs }): Fields[] => {
    const name = text.trim().slice(0, 200);
    if (!isMaterial(kind) || name === '' || known.has(plain(name))) return [];
    known.add(plain(name));
    const details = { heard: text.slice(0, 500), heardAtMs: Math.round(atMs) };
    return [{ kind: FILLING.test(name) ? 'filling' : MATERIALS[kind], name, details }];
  });
}

/**
 * Cautions spoken of in a recording: in the usual words where its kind has some, else as heard. What the pattern's
 * materials bring by themselves needs no row.
 */
export function suggestedCautions(
  suggestions: readonly Suggestion[],
  present: readonly Fields[],
  brought: ReadonlySet<string>,
): Fields[] {
  const known = new Set(present.map(({ kind, text }) => (kind === 'own' ? plain(text) : kind)));
  return suggestions.flatMap(({ kind, text }): Fields[] => {
    if (kind !== 'caution' || text.trim() === '') return [];
    const usual = broughtCautions({ materials: [{ name: text }], lines: [], uses: [] })[0];
    const mark = usual?.kind ?? plain(text);
    if (known.has(mark) || brought.has(mark)) return [];
    known.add(mark);
    return [usual ? { kind: usual.kind, text: usual.text } : { kind: 'own', text: text.trim().slice(0, 1_000) }];
  });
}
