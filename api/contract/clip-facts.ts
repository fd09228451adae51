/**
 * What a clip is, and whether every browser plays it: asked in the browser before anything is sent, and by the server
 * of what has arrived. The codec decides, never the name: H.264 plays in `.mov` as well, HEVC in neither.
 */

export type Container = 'mp4' | 'mov' | 'webm' | 'other';

export interface ClipFacts {
  readonly container: Container;
  /** "avc", "hevc", "vp9" …; null where there is no picture, or one nobody knows. */
  readonly video: string | null;
  /** As in MIME types: "avc1.640028". */
  readonly videoDetail: string | null;
  /** Null where there is no sound; "unknown" where it is in a form nobody knows. */
  readonly audio: string | null;
  readonly durationMs: number;
}

interface Track {
  getCodec(): Promise<string | null>;
  getCodecParameterString(): Promise<string | null>;
}

/** The part of a media reader that is asked; both sides open it over their own bytes. */
export interface ClipReader {
  getFormat(): Promise<{ readonly name: string }>;
  getPrimaryVideoTrack(): Promise<Track | null>;
  getPrimaryAudioTrack(): Promise<Track | null>;
  getDurationFromMetadata(): Promise<number | null>;
  computeDuration(): Promise<number>;
}

const CONTAINERS: Readonly<Record<string, Container>> = { MP4: 'mp4', 'QuickTime File Format': 'mov', WebM: 'webm' };

/** Asks the reader; reads only the few ranges where a file describes itself. */
export async function clipFacts(reader: ClipReader): Promise<ClipFacts> {
  const format = await reader.getFormat();
  const video = await reader.getPrimaryVideoTrack();
  const audio = await reader.getPrimaryAudioTrack();
  const seconds = (await reader.getDurationFromMetadata()) ?? (await reader.computeDuration());
  return {
    container: CONTAINERS[format.name] ?? 'other',
    video: video && (await video.getCodec()),
    videoDetail: video && (await video.getCodecParameterString()),
    audio: audio && ((await audio.getCodec()) ?? 'unknown'),
    durationMs: Math.round(seconds * 1_000),
  };
}

const EXPORT = 'Export it as H.264 with AAC sound in MP4, and choose that file.';
const PLAYS = new Set(['avc', 'vp8', 'vp9', 'av1']);
const SOUNDS = new Set(['aac', 'mp3', 'opus', 'vorbis', 'flac']);
const NAMES: Readonly<Record<string, string>> = { hevc: 'HEVC (H.265)', prores: 'ProRes' };
/** Profiles of H.264 with ten bits or more colour than browsers take: High 10, High 4:2:2, High 4:4:4. */
const WIDE_H264 = /^avc[13]\.(?:6e|7a|f4)/i;

/**
 * Why a clip cannot be used, as a sentence that says what to export instead; null when every browser plays it.
 * @example whyUnplayable({ container: 'mp4', video: 'hevc', … }) // "This recording is HEVC (H.265), which …"
 */
export function whyUnplayable(clip: ClipFacts): string | null {
  if (clip.container === 'other') return `Only MP4, WebM and MOV can be shown in a browser. ${EXPORT}`;
  if (clip.video === null) return `There is no picture in this file that a browser can show. ${EXPORT}`;
  if (!PLAYS.has(clip.video)) {
    return `This recording is ${NAMES[clip.video] ?? clip.video}, which many browsers do not play. ${EXPORT}`;
  }
  if (WIDE_H264.test(clip.videoDetail ?? '')) {
    return `This recording holds more colour (10 bit or 4:2:2) than browsers play. ${EXPORT}`;
  }
  if (clip.audio !== null && !SOUNDS.has(clip.audio)) {
    return `The sound of this recording is in a form that many browsers do not play. ${EXPORT}`;
  }
  if (clip.durationMs <= 0)
    return `This recording has no length: it may have been cut off while it was saved. ${EXPORT}`;
  return null;
}

/** What a file is served as. */
export const CONTAINER_TYPES: Readonly<Record<Exclude<Container, 'other'>, string>> = {
  mp4: 'video/mp4',
  mov: 'video/quicktime',
  webm: 'video/webm',
};

/** What the name of a file says it is, by its ending; null for any other ending. */
export function containerOfName(name: string): Exclude<Container, 'other'> | null {
  const ending = /\.([a-z0-9]+)$/i.exec(name.trim())?.[1]?.toLowerCase();
  if (ending === 'mp4' || ending === 'm4v') return 'mp4';
  if (ending === 'mov') return 'mov';
  return ending === 'webm' ? 'webm' : null;
}

const BOXES = new Set(['ftyp', 'moov', 'mdat', 'wide', 'free', 'skip', 'pnot']);

/**
 * Whether the first bytes are of the family the name says: a box of MP4 and QuickTime, or the head of WebM.
 * @param bytes the beginning of the file, eight bytes or more
 */
export function beginsLike(kind: Exclude<Container, 'other'>, bytes: Uint8Array): boolean {
  if (kind === 'webm') return bytes[0] === 0x1a && bytes[1] === 0x45 && bytes[2] === 0xdf && bytes[3] === 0xa3;
  return BOXES.has(String.fromCharCode(...bytes.subarray(4, 8)));
}
