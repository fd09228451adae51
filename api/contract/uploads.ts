import { z } from 'zod';

/** A clip in parts. The parts themselves are multipart forms: field `sha256` first, then the file field `part`. */

/** Eight gigabytes: what a clip may weigh. */
export const CLIP_BYTES = 8_000_000_000;
/** A digest of this much from the start of a file is one of the four facts that say "the same file". */
export const FIRST_BYTES = 1_048_576;

/** SHA-256 in lower-case hexadecimal. */
export const Sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'A SHA-256 has 64 hexadecimal digits.');

/** Body of POST /api/recordings/:recordingId/clip. */
export const ClipStart = z.strictObject({
  name: z.string().min(1).max(500),
  size: z.int().min(1),
  /** Milliseconds since 1970, as the browser tells it. */
  lastModified: z.int(),
  firstMiBSha256: Sha256,
});
export type ClipStart = z.infer<typeof ClipStart>;

/** Which parts are already here: the sender goes on with the others. */
export const ClipStarted = z.object({
  uploadId: z.uuid(),
  partSize: z.int().positive(),
  have: z.array(z.int().positive()),
});
export type ClipStarted = z.infer<typeof ClipStarted>;

export const PartRef = z.object({ uploadId: z.uuid(), n: z.coerce.number<string>().int().min(1).max(10_000) });
export const PartDigest = z.strictObject({ sha256: Sha256 });

export const PartTaken = z.object({ n: z.int().positive(), size: z.int().positive(), sha256: Sha256 });
export type PartTaken = z.infer<typeof PartTaken>;
