import { BlobSource, Input, MATROSKA, MP4, QTFF, WEBM } from 'mediabunny';
import { clipFacts, type ClipFacts } from '#contract/clip-facts';

/**
 * Reads the few places where a file describes itself as a film.
 * @throws when it is no film, or breaks off
 */
export async function readFilm(file: File): Promise<ClipFacts> {
  const input = new Input({ formats: [MP4, QTFF, WEBM, MATROSKA], source: new BlobSource(file) });
  try {
    return await clipFacts(input);
  } finally {
    input.dispose();
  }
}
