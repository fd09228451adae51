import { CustomSource, Input, MATROSKA, MP4, QTFF, WEBM } from 'mediabunny';
import { clipFacts, type ClipFacts } from '#contract/clip-facts';
import { StorageDown, type Storage } from '../../platform/storage.ts';

async function readBytes(storage: Storage, key: string, start: number, end: number): Promise<Uint8Array> {
  // The reader counts its end out, HTTP counts it in.
  const found = await storage.get(key, { start, end: end - 1 });
  if (!found) throw new StorageDown('the object is not there to be read');
  const chunks: Buffer[] = [];
  for await (const chunk of found.body) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}

/**
 * Finds out what a stored object is, reading only the ranges where a film describes itself (for many recordings
 * the end of the file).
 * @returns null when it is no film at all, or one that breaks off
 * @throws StorageDown
 */
export async function inspectClip(storage: Storage, key: string, bytes: number): Promise<ClipFacts | null> {
  let down: Error | undefined;
  const input = new Input({
    formats: [MP4, QTFF, WEBM, MATROSKA],
    source: new CustomSource({
      getSize: () => bytes,
      read: async (start, end) => {
        try {
          return await readBytes(storage, key, start, end);
        } catch (err) {
          down = err instanceof Error ? err : new StorageDown('a clip could not be read', { cause: err });
          throw down;
        }
      },
      prefetchProfile: 'network',
      // What the reader fetches ahead and never asks for concerns nobody.
      handleUnhandledError: () => undefined,
    }),
  });
  try {
    return await clipFacts(input);
  } catch (err) {
    // A file of another kind, and one that is damaged or breaks off, make the reader stop in many ways.
    if (down ?? !(err instanceof Error)) throw down ?? err;
    return null;
  } finally {
    input.dispose();
  }
}
