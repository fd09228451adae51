import { createHash } from 'node:crypto';

/**
 * Remembers what a pure function made of the same input, for the last `most` inputs. What is remembered depends on
 * nothing else, so that several processes beside each other cannot disagree.
 */
export function remember<In, Out>(work: (input: In) => Out, most: number): (input: In) => Out {
  const known = new Map<string, Out>();
  return (input) => {
    const key = createHash('sha256').update(JSON.stringify(input)).digest('base64url');
    const found = known.get(key);
    const out = found ?? work(input);
    // Last used last: the first of the map is the one to forget.
    known.delete(key);
    known.set(key, out);
    if (known.size > most) known.delete(known.keys().next().value ?? '');
    return out;
  };
}
